import { HttpClient } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import type { Observable } from 'rxjs';
import { map } from 'rxjs';
import type {
  DescriptionChange,
  LoadingChange,
  LoadingHistory,
  MachineDetails,
  MachineList,
  MacroChange,
  OffsetChange,
  RackChange,
  Revision,
  SetupImport,
} from '#contracts';
import {
  loadingHistorySchema,
  machineDetailsSchema,
  machineListSchema,
  revisionListSchema,
} from '#contracts';
import { parsed } from '../http/parsed';

const MACHINES = '/api/v1/machines';
export type RevisedPart = 'description' | 'rack' | 'offsets' | 'macro';

/** Machines of the shop and what stands on them, read and changed over HTTP. */
@Injectable({ providedIn: 'root' })
export class MachineClient {
  readonly #http = inject(HttpClient);

  list(): Observable<MachineList['machines']> {
    return this.#http.get(MACHINES).pipe(
      parsed(machineListSchema),
      map((list) => list.machines),
    );
  }
  details(id: string): Observable<MachineDetails> {
    return this.#http.get(`${MACHINES}/${id}`).pipe(parsed(machineDetailsSchema));
  }
  saveDescription(id: string, change: DescriptionChange): Observable<MachineDetails> {
    return this.#put(`${id}/description`, change);
  }
  saveRack(id: string, change: RackChange): Observable<MachineDetails> {
    return this.#put(`${id}/rack`, change);
  }
  saveLoading(id: string, change: LoadingChange): Observable<MachineDetails> {
    return this.#put(`${id}/loading`, change);
  }
  saveOffsets(id: string, change: OffsetChange): Observable<MachineDetails> {
    return this.#put(`${id}/offsets`, change);
  }
  saveMacro(id: string, change: MacroChange): Observable<MachineDetails> {
    return this.#put(`${id}/macro`, change);
  }
  loadings(id: string): Observable<LoadingHistory['revisions']> {
    return this.#http.get(`${MACHINES}/${id}/loading/revisions`).pipe(
      parsed(loadingHistorySchema),
      map((history) => history.revisions.toSorted((one, other) => other.number - one.number)),
    );
  }
  revisions(id: string, part: RevisedPart): Observable<readonly Revision[]> {
    return this.#http.get(`${MACHINES}/${id}/${part}/revisions`).pipe(
      parsed(revisionListSchema),
      map((list) => list.revisions.toSorted((one, other) => other.number - one.number)),
    );
  }
  /** The setup document as the server writes it, byte for byte. */
  setupFile(id: string): Observable<Blob> {
    return this.#http.get(`${MACHINES}/${id}/setup`, { responseType: 'blob' });
  }
  importSetup(id: string, document: SetupImport): Observable<MachineDetails> {
    return this.#put(`${id}/setup`, document);
  }
  addMachine(document: SetupImport): Observable<MachineDetails> {
    return this.#http.post(MACHINES, document).pipe(parsed(machineDetailsSchema));
  }

  #put(path: string, body: unknown): Observable<MachineDetails> {
    return this.#http.put(`${MACHINES}/${path}`, body).pipe(parsed(machineDetailsSchema));
  }
}
