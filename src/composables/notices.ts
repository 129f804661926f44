import { Notify } from 'quasar';

export interface NoticeAction {
  readonly label: string;
  readonly handler: () => void;
}

/** Says in passing what has happened; with an action it stays longer, so that there is time to take it. */
export function notice(message: string, action?: NoticeAction): void {
  Notify.create({
    message,
    ...(action && { actions: [{ label: action.label, handler: action.handler }], timeout: ACTION_MS }),
  });
}

/** Long enough to read a sentence and reach for the button, ten seconds: common practice. */
const ACTION_MS = 10_000;
