import { z } from 'zod';

const NAME = 'siltline.session';
const messageSchema = z.enum(['signed-in', 'signed-out']);
export type SessionMessage = z.infer<typeof messageSchema>;

export interface SessionChannel {
  tell(message: SessionMessage): void;
  listen(listener: (message: SessionMessage) => void): void;
}

let opened: SessionChannel | null = null;

/** Tells the other tabs of this browser who came and went. One for the page: it does not hear itself. */
export function sessionChannel(): SessionChannel {
  opened ??= open(new BroadcastChannel(NAME));
  return opened;
}

function open(channel: BroadcastChannel): SessionChannel {
  return {
    tell: (message) => channel.postMessage(message),
    listen: (listener) =>
      channel.addEventListener('message', ({ data }) => {
        const parsed = messageSchema.safeParse(data);
        if (parsed.success) listener(parsed.data);
      }),
  };
}
