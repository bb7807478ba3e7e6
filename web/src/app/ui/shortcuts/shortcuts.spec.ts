import { TestBed } from '@angular/core/testing';
import { Shortcuts } from './shortcuts';

function open(): { shortcuts: Shortcuts; ran: string[] } {
  localStorage.clear();
  const shortcuts = TestBed.inject(Shortcuts);
  const ran: string[] = [];
  const keys = ['?', 'g b'];
  TestBed.runInInjectionContext(() =>
    shortcuts.add(
      ...keys.map((each) => ({
        keys: each,
        does: each,
        place: 'Everywhere',
        run: () => void ran.push(each),
      })),
    ),
  );
  return { shortcuts, ran };
}

function press(key: string, on: EventTarget = document.body, more: KeyboardEventInit = {}): void {
  on.dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true, ...more }));
}

describe('Shortcuts', () => {
  it('runs what a key or a pair of keys stands for', () => {
    const { ran } = open();
    press('?');
    press('g');
    press('b');
    expect(ran).toEqual(['?', 'g b']);
  });

  it('rests while something is typed', () => {
    const { ran } = open();
    const field = document.body.appendChild(document.createElement('input'));
    press('?', field);
    field.remove();
    expect(ran).toEqual([]);
  });

  it('rests while a dialog is open, and leaves keys with Ctrl to the browser', () => {
    const { ran } = open();
    press('?', document.body, { ctrlKey: true });
    const dialog = document.body.appendChild(document.createElement('div'));
    dialog.setAttribute('role', 'dialog');
    press('?');
    dialog.remove();
    expect(ran).toEqual([]);
  });

  it('can be turned off, and stays off', () => {
    const { shortcuts, ran } = open();
    shortcuts.turn(false);
    press('?');
    expect(ran).toEqual([]);
    expect(localStorage.getItem('nightlatch.shortcuts')).toBe('off');
  });
});
