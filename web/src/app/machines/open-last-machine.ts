import { inject } from '@angular/core';
import type { CanActivateFn } from '@angular/router';
import { Router } from '@angular/router';
import { catchError, map, of } from 'rxjs';
import { LastMachine } from './last-machine';
import { MachineClient } from './machine-client';

/**
 * Opens the machine last looked at on this screen, for a place that shows one machine. With no
 * machine, or no answer, the page behind this route says so itself.
 */
export function openLastMachine(place: string): CanActivateFn {
  return () => {
    const last = inject(LastMachine);
    const router = inject(Router);
    return inject(MachineClient)
      .list()
      .pipe(
        map((machines) => {
          const machine = last.among(machines);
          return machine ? router.createUrlTree([place, machine.id]) : true;
        }),
        catchError(() => of(true)),
      );
  };
}
