import { randomBytes } from 'node:crypto';
import { mkdir, open, readFile } from 'node:fs/promises';
import { join } from 'node:path';

const FILE = 'token-secret';

/**
 * What signs access tokens: the configured secret, or one made at the first start and kept in the data
 * folder, readable by this user alone. Losing the file signs everyone out and does no other harm.
 */
export async function keepTokenSecret(config: {
  readonly tokenSecret: string | undefined;
  readonly dataFolder: string;
}): Promise<string> {
  if (config.tokenSecret !== undefined) return config.tokenSecret;
  await mkdir(config.dataFolder, { recursive: true });
  const path = join(config.dataFolder, FILE);
  try {
    // 'wx' fails when the file is there: of two servers that start together one makes it.
    const file = await open(path, 'wx', 0o600);
    const secret = randomBytes(48).toString('base64url');
    await file.writeFile(secret);
    await file.close();
    return secret;
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'EEXIST') throw error;
  }
  const secret = (await readFile(path, 'utf8')).trim();
  if (secret.length < 32) {
    throw new Error(
      `${path} holds no usable secret. Delete the file; a new one is made at the start.`,
    );
  }
  return secret;
}
