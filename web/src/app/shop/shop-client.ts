import { HttpClient } from '@angular/common/http';
import { Injectable, inject } from '@angular/core';
import type { Observable } from 'rxjs';
import { map } from 'rxjs';
import type { z } from 'zod';
import type { NewPerson, Person, PersonChange, ShopChange, ShopDetails } from '#contracts';
import {
  auditTrailSchema,
  peopleSchema,
  personSchema,
  shopPolicySchema,
  shopSchema,
} from '#contracts';
import { parsed } from '../http/parsed';

export type Policy = z.output<typeof shopPolicySchema>;
export type AuditTrail = z.output<typeof auditTrailSchema>;

/** The shop itself: its people, its settings, and what was done in it. */
@Injectable({ providedIn: 'root' })
export class ShopClient {
  readonly #http = inject(HttpClient);

  people(): Observable<readonly Person[]> {
    return this.#http.get('/api/v1/people').pipe(
      parsed(peopleSchema),
      map((list) => list.people),
    );
  }
  addPerson(person: NewPerson): Observable<Person> {
    return this.#http.post('/api/v1/people', person).pipe(parsed(personSchema));
  }
  changePerson(id: string, change: PersonChange): Observable<Person> {
    return this.#http.patch(`/api/v1/people/${id}`, change).pipe(parsed(personSchema));
  }
  audit(offset: number, limit: number): Observable<AuditTrail> {
    return this.#http
      .get('/api/v1/audit', { params: { offset, limit } })
      .pipe(parsed(auditTrailSchema));
  }
  shop(): Observable<ShopDetails> {
    return this.#http.get('/api/v1/shop').pipe(parsed(shopSchema));
  }
  changeShop(change: ShopChange): Observable<ShopDetails> {
    return this.#http.patch('/api/v1/shop', change).pipe(parsed(shopSchema));
  }
  policy(): Observable<Policy> {
    return this.#http.get('/api/v1/shop/policy').pipe(parsed(shopPolicySchema));
  }
  setPolicy(policy: Policy): Observable<Policy> {
    return this.#http.put('/api/v1/shop/policy', policy).pipe(parsed(shopPolicySchema));
  }
}
