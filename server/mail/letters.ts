/** A mail as people read it; made into text and HTML in one place. */
export interface Letter {
  readonly subject: string;
  readonly paragraphs: readonly string[];
  readonly link?: { readonly label: string; readonly url: string };
  /** Why it was sent. */
  readonly reason: string;
}

const NOT_YOU = 'If it was not you, you need not do anything.';

export function confirmationLetter(publicUrl: string, secret: string): Letter {
  return {
    subject: 'Please confirm your address',
    paragraphs: [
      'Welcome to Siltline.',
      'Open this page and confirm that the address is yours. The link works once, for two days.',
    ],
    // In the fragment: no server, proxy or log on the way sees it.
    link: { label: 'Confirm my address', url: `${publicUrl}/confirm#${secret}` },
    reason: `Somebody signed up to Siltline with this address. ${NOT_YOU}`,
  };
}

export function addressKnownLetter(publicUrl: string): Letter {
  return {
    subject: 'You have an account already',
    paragraphs: [
      'Somebody tried to sign up to Siltline with your address. You have an account with it already, and nothing about it was changed.',
      'If it was you, sign in, or ask for a new password there.',
    ],
    link: { label: 'Sign in', url: `${publicUrl}/sign-in` },
    reason: `This was sent because your address was given at sign-up. ${NOT_YOU}`,
  };
}

export function passwordResetLetter(publicUrl: string, secret: string): Letter {
  return {
    subject: 'A new password',
    paragraphs: ['Open this page and choose a new password. The link works once, for one hour.'],
    link: { label: 'Choose a new password', url: `${publicUrl}/reset-password#${secret}` },
    reason: `Somebody asked for a new password for this address. ${NOT_YOU} Your password stays as it is.`,
  };
}

interface SharedStudy {
  readonly sharerName: string;
  readonly title: string;
  readonly studyId: string;
  readonly may: 'view' | 'comment';
}

export function sharedStudyLetter(publicUrl: string, shared: SharedStudy): Letter {
  const may = shared.may === 'comment' ? 'look at it, play it and annotate it' : 'look at it and play it';
  return {
    subject: `${shared.sharerName} shared a study with you`,
    paragraphs: [
      `${shared.sharerName} shared the study “${shared.title}” with you. You may ${may}.`,
      'Sign in with this address to open it. If you have no account yet, sign up with it.',
    ],
    link: { label: 'Open the study', url: `${publicUrl}/studies/${shared.studyId}` },
    reason: `This was sent because ${shared.sharerName} shared a study with this address on Siltline.`,
  };
}
