import type { z } from 'zod';
import type { jobChangeSchema, ProgramDetails } from '#contracts';
import type { Dependencies } from '../dependencies';
import type { Author } from '../http/route';

/** A new revision of a program's job sheet; checks made before keep the one they were held against. */
export async function changeJob(
  deps: Pick<Dependencies, 'database'>,
  actor: Author,
  programId: string,
  { basedOn, job }: z.output<typeof jobChangeSchema>,
): Promise<ProgramDetails> {
  return await deps.database.transaction(async (stores) => {
    const details = await stores.programs.changeJob(actor.shopId, programId, {
      basedOn,
      job,
      madeBy: actor.id,
    });
    await stores.audit.add(actor.shopId, {
      personId: actor.id,
      action: 'program.change-job',
      subject: details.program.name,
      detail: { programId, revision: details.jobRevision },
    });
    return details;
  });
}
