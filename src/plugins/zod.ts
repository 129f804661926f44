import { z } from 'zod';

/** Without this zod tries `eval` once, which the page's content security policy refuses and reports. */
export function configureZod(): void {
  z.config({ jitless: true });
}
