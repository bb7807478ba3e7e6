import type { UploadResult } from '#contracts';
import type { Stores } from '../db/database';
import type { AddedRevision } from '../db/stores/program-store';
import type { Dependencies } from '../dependencies';
import type { Author } from '../http/route';
import { askForCheck } from '../checks/ask-for-check';
import { readProgram, RefusedFile } from './read-program';
import { programName } from './program-name';

export type FileOutcome = UploadResult['files'][number];

export interface Upload {
  /** As the file was called where it came from; shown, never used as a path. */
  readonly fileName: string;
  readonly machineId: string;
  readonly limitBytes: number;
  readonly source: AsyncIterable<Uint8Array>;
}

/**
 * Stores one file as a program, or as a new revision of the program of that name, and asks for its check:
 * all of it or, when the file is refused or breaks off, none. The same bytes as the newest revision make
 * no revision, but they are checked again.
 */
export async function uploadProgram(
  deps: Dependencies,
  actor: Author,
  { fileName, machineId, limitBytes, source }: Upload,
): Promise<FileOutcome> {
  const name = programName(fileName);
  try {
    return await deps.database.transaction(async (stores) => {
      const text = readProgram(source, limitBytes);
      const { programId, revisionId, revision, unchanged } = await storeProgram(
        stores,
        actor,
        fileName,
        text,
      );
      const check = await askForCheck(stores, actor, {
        programRevisionId: revisionId,
        machineId,
        cause: 'upload',
      });
      const ids = { programId, revisionId, checkId: check.id };
      return { outcome: 'stored', name, ...ids, revision, unchanged };
    });
  } catch (error) {
    if (!(error instanceof RefusedFile)) throw error;
    return { outcome: 'refused', name, ...error.why };
  }
}

/** The text as a revision of the program of that name, on record. */
export async function storeProgram(
  stores: Stores,
  actor: Author,
  fileName: string,
  source: AsyncIterable<Uint8Array>,
): Promise<AddedRevision> {
  const name = programName(fileName);
  const { textId, sha256, bytes } = await stores.programs.writeText(actor.shopId, source);
  const added = await stores.programs.addRevision(actor.shopId, {
    name,
    textId,
    originalName: shownName(fileName),
    uploadedBy: actor.id,
  });
  await stores.audit.add(actor.shopId, {
    personId: actor.id,
    action: 'program.upload',
    subject: name,
    detail: { ...added, sha256, bytes },
  });
  return added;
}

/** PostgreSQL keeps no NUL in text; and nobody needs a name longer than any file system allows. */
function shownName(fileName: string): string {
  return fileName.replaceAll('\0', '').slice(0, 1000);
}
