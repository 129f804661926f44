import supertest, { type Response } from 'supertest';
import type { Analysis } from '#shared/contracts/analysis';
import { analysisSchema } from '#shared/contracts/analysis';
import { midiOfName } from '#shared/pitch/names';
import { sectionFor } from '#shared/voicing/calibration/yardsticks';
import type { TestApp } from './app';

/** Calls a route as a script would: no cookie, no token. */
export function call({ app }: Pick<TestApp, 'app'>, path: string, body: object): Promise<Response> {
  return Promise.resolve(supertest(app).post(path).send(body));
}

/** The paths of what a refused call was told, each once, in order. */
export function faultPaths({ body }: Response): string[] {
  const paths = body.error.details.map(({ path }: { path: string }) => path);
  return [...new Set<string>(paths)].sort();
}

/** The analysis of `D2 A2 F3`: one section a note, eight players on each. */
export async function analysisOf(at: Pick<TestApp, 'app'>, names: string): Promise<Analysis> {
  const voices = names
    .split(' ')
    .map((pitch) => ({ section: sectionFor(midiOfName(pitch)), pitch, players: 8 }));
  const answer = await call(at, '/api/analysis', { voices });
  if (answer.status !== 200) throw new Error(`not analysed: ${answer.status}`);
  return analysisSchema.parse(answer.body);
}
