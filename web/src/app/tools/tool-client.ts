import { HttpClient } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import type { Observable } from 'rxjs';
import { map } from 'rxjs';
import type { Measurement, NewTool, Revision, ToolChange, ToolRecord } from '#contracts';
import { revisionListSchema, toolListSchema, toolRecordSchema } from '#contracts';
import { parsed } from '../http/parsed';

const TOOLS = '/api/v1/tools';

/** The shop's tool list, read and changed over HTTP. */
@Injectable({ providedIn: 'root' })
export class ToolClient {
  readonly #http = inject(HttpClient);

  list(): Observable<readonly ToolRecord[]> {
    return this.#http.get(TOOLS).pipe(
      parsed(toolListSchema),
      map(({ tools }) => tools.toSorted((one, other) => one.tool.number - other.tool.number)),
    );
  }
  add(tool: NewTool): Observable<ToolRecord> {
    return this.#http.post(TOOLS, tool).pipe(parsed(toolRecordSchema));
  }
  save(id: string, change: ToolChange): Observable<ToolRecord> {
    return this.#http.put(`${TOOLS}/${id}`, change).pipe(parsed(toolRecordSchema));
  }
  measure(id: string, measurement: Measurement): Observable<ToolRecord> {
    return this.#http
      .post(`${TOOLS}/${id}/measurements`, measurement)
      .pipe(parsed(toolRecordSchema));
  }
  revisions(id: string): Observable<readonly Revision[]> {
    return this.#http.get(`${TOOLS}/${id}/revisions`).pipe(
      parsed(revisionListSchema),
      map((list) => list.revisions.toSorted((one, other) => other.number - one.number)),
    );
  }
}
