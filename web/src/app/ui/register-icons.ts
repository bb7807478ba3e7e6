import { inject } from '@angular/core';
import { MatIconRegistry } from '@angular/material/icon';
import { DomSanitizer } from '@angular/platform-browser';
import binSvg from '../../icons/bin.svg';
import blankSvg from '../../icons/blank.svg';
import chosenSvg from '../../icons/chosen.svg';
import closeSvg from '../../icons/close.svg';
import downloadSvg from '../../icons/download.svg';
import eyeSvg from '../../icons/eye.svg';
import keysSvg from '../../icons/keys.svg';
import latchSvg from '../../icons/latch.svg';
import menuSvg from '../../icons/menu.svg';
import pencilSvg from '../../icons/pencil.svg';
import personSvg from '../../icons/person.svg';
import plusSvg from '../../icons/plus.svg';
import searchSvg from '../../icons/search.svg';
import uploadSvg from '../../icons/upload.svg';

const ICONS = {
  bin: binSvg,
  blank: blankSvg,
  chosen: chosenSvg,
  close: closeSvg,
  download: downloadSvg,
  eye: eyeSvg,
  keys: keysSvg,
  latch: latchSvg,
  menu: menuSvg,
  pencil: pencilSvg,
  person: personSvg,
  plus: plusSvg,
  search: searchSvg,
  upload: uploadSvg,
} as const;

/** Makes our own drawings known to mat-icon; they travel in the bundle, so no request is made. */
export function registerIcons(): void {
  const registry = inject(MatIconRegistry);
  const sanitizer = inject(DomSanitizer);
  for (const [name, svg] of Object.entries(ICONS)) {
    registry.addSvgIconLiteral(name, sanitizer.bypassSecurityTrustHtml(svg));
  }
}
