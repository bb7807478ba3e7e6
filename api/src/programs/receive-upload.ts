import type { Request, Response } from 'express';
import multer, { MulterError, type StorageEngine } from 'multer';
import type { UploadResult } from '#contracts';
import type { Dependencies } from '../dependencies';
import { notFound, refuse, type Refusal } from '../http/problems';
import type { Author } from '../http/route';
import { uploadProgram, type FileOutcome } from './upload-program';

const FIELD = 'files';
/** A night's queue is tens of programs; a thousand in one request is a mistake. */
const MOST_FILES = 500;

/**
 * Reads the files of one request as they stream in, each straight into the store: no file is held in
 * memory, none touches a disk. They are stored one after the other, each on its own: a refused file does
 * not sink the others, and when the sender goes away the files already stored stay stored.
 */
export async function receiveUpload(
  deps: Dependencies,
  actor: Author,
  machineId: string,
  http: { readonly request: Request; readonly response: Response },
): Promise<UploadResult> {
  if (!http.request.is('multipart/form-data')) {
    throw refuse('not-multipart', `The request is no form upload with files in "${FIELD}".`);
  }
  const { stores } = deps.database;
  if (!(await stores.machines.details(actor.shopId, machineId))) throw notFound('machine');
  const shop = await stores.shops.find(actor.shopId);
  if (!shop) throw notFound('shop');
  const files = await readFiles(http, (fileName, source) =>
    deps.uploads.pass(() =>
      uploadProgram(deps, actor, {
        fileName,
        machineId,
        limitBytes: shop.uploadLimitBytes,
        source,
      }),
    ),
  );
  if (files.length === 0) {
    throw refuse('not-multipart', `The form holds no file in the field "${FIELD}".`);
  }
  return { files };
}

type StoreFile = (fileName: string, source: AsyncIterable<Uint8Array>) => Promise<FileOutcome>;

async function readFiles(
  { request, response }: { readonly request: Request; readonly response: Response },
  store: StoreFile,
): Promise<FileOutcome[]> {
  const outcomes: FileOutcome[] = [];
  const receive = multer({
    storage: streamingStorage(store, outcomes),
    // Browsers send names as UTF-8; the default would read them as Latin-1.
    defParamCharset: 'utf8',
    limits: { files: MOST_FILES, fields: 0, parts: MOST_FILES },
  }).array(FIELD);
  await new Promise<void>((resolve, reject) => {
    receive(request, response, (error: unknown) => {
      if (error) reject(asRefusal(error));
      else resolve();
    });
  });
  return outcomes;
}

/**
 * multer's storage, except that it keeps nothing itself. Files of one request wait for one another, so
 * that two of the same name become two revisions in the order they were sent.
 */
function streamingStorage(store: StoreFile, outcomes: FileOutcome[]): StorageEngine {
  let before: Promise<unknown> = Promise.resolve();
  return {
    _handleFile: (_request, file, done) => {
      const stored = before.then(async () => {
        // A refused file is left whole and read to its end: those behind it come through the same pipe.
        const source = file.stream.iterator({ destroyOnReturn: false });
        const outcome = await store(file.originalname, source);
        file.stream.resume();
        outcomes.push(outcome);
      });
      before = stored.catch(() => undefined);
      stored.then(
        () => done(null, {}),
        (error: unknown) => done(error),
      );
    },
    // What was stored whole before the request broke off is a program like any other.
    _removeFile: (_request, _file, done) => done(null),
  };
}

/** What multer and its parser throw, told apart from faults of our own. */
function asRefusal(error: unknown): unknown {
  if (error instanceof MulterError) return refusalOfMulter(error);
  if (error instanceof Error && BROKEN_OFF.test(error.message)) {
    return refuse('upload-broken-off', 'The upload ended before its last file was complete.');
  }
  if (error instanceof Error && /boundary|Malformed/i.test(error.message)) {
    return refuse(
      'unreadable-body',
      'The form upload cannot be read: its parts are not well formed.',
    );
  }
  return error;
}

const BROKEN_OFF =
  /Unexpected end of (form|file)|Request (aborted|closed)|aborted|Premature close/i;

function refusalOfMulter(error: MulterError): Refusal {
  switch (error.code) {
    case 'LIMIT_FILE_COUNT':
    case 'LIMIT_PART_COUNT':
      return refuse('too-large', `One upload takes ${MOST_FILES} files at most.`);
    case 'LIMIT_UNEXPECTED_FILE':
    case 'LIMIT_FIELD_COUNT':
      return refuse('not-multipart', `Only files in the field "${FIELD}" are taken.`);
    default:
      return refuse('unreadable-body', `The form upload cannot be read: ${error.message}.`);
  }
}
