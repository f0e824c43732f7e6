/** The client is built before the workers start: each of them opens a product of its own, on the same build. */
import { buildWeb } from '@/server/cli/buildWeb';

export default async function buildOnce(): Promise<void> {
  await buildWeb(console.log);
}
