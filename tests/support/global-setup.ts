import { startThrowawayDatabase } from '../../server/bin/prepare/throwaway-database.ts';
import { prepareTools } from '../../server/bin/prepare/system-tools.ts';
import { databaseTools, pdfTools } from '../../server/bin/prepare/tool-list.ts';

/**
 * Gives the server's tests a database server (TEST_DATABASE_URL) when nobody has: `npm test` does, a bare `npx vitest`
 * does not. Runs that name only tests without a database are spared the two seconds.
 */
export default async function setup(): Promise<(() => Promise<void>) | undefined> {
  if (process.env.TEST_DATABASE_URL || namesOnlyPureTests(process.argv)) return undefined;
  const tools = await prepareTools([databaseTools, pdfTools]);
  const database = await startThrowawayDatabase(tools);
  process.env.TEST_DATABASE_URL = database.serverUrl;
  process.env.PATH = tools.searchPath;
  return () => database.stop();
}

function namesOnlyPureTests(args: string[]): boolean {
  const named = args.filter((arg) => /(^|\/)tests\//.test(arg));
  return named.length > 0 && named.every((arg) => /(^|\/)tests\/(shared|src)(\/|$)/.test(arg));
}
