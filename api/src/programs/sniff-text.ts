/** As many first bytes as are looked at before a file is taken for a program. */
export const SNIFFED_BYTES = 8192;

export interface NotText {
  readonly code: 'not-text' | 'utf-16';
  readonly reason: string;
  readonly next: string;
}

/** First bytes that kinds of files always have; their published signatures. */
const SIGNATURES: readonly { readonly bytes: readonly number[]; readonly is: string }[] = [
  { bytes: [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a], is: 'a PNG picture' },
  { bytes: [0xff, 0xd8, 0xff], is: 'a JPEG picture' },
  { bytes: [0x47, 0x49, 0x46, 0x38], is: 'a GIF picture' },
  { bytes: [0x25, 0x50, 0x44, 0x46, 0x2d], is: 'a PDF document' },
  { bytes: [0x50, 0x4b, 0x03, 0x04], is: 'a ZIP archive' },
  { bytes: [0x1f, 0x8b], is: 'a gzip archive' },
  { bytes: [0x7f, 0x45, 0x4c, 0x46], is: 'an executable' },
  { bytes: [0xd0, 0xcf, 0x11, 0xe0], is: 'an office document' },
];

/** More control characters than this share of the bytes looked at is no text anyone posted. */
const MOST_CONTROLS = 0.1;
/** A few spare bytes must not decide about a file of a few lines. */
const FEW_CONTROLS = 8;

/** Why a file that begins with `head` is no program text; undefined when it may be one. */
export function sniffText(head: Uint8Array): NotText | undefined {
  const signature = SIGNATURES.find(({ bytes }) => bytes.every((byte, at) => head[at] === byte));
  if (signature) return notText(`It is ${signature.is}, not program text.`);
  if (isUtf16(head)) return UTF_16;
  const nul = head.indexOf(0);
  if (nul !== -1) {
    return notText(`Byte ${nul + 1} is zero, so it is a binary file, not program text.`);
  }
  const controls = head.reduce((count, byte) => count + (isStrayControl(byte) ? 1 : 0), 0);
  if (FEW_CONTROLS < controls && head.length * MOST_CONTROLS < controls) {
    return notText(
      `${controls} of its first ${head.length} bytes are control characters, so it is a binary file.`,
    );
  }
  return undefined;
}

const UTF_16: NotText = {
  code: 'utf-16',
  reason: 'It is saved as UTF-16, two bytes a character, which no controller here reads.',
  next: 'Save it again as plain text (ASCII or UTF-8) and upload that.',
};

function notText(reason: string): NotText {
  return {
    code: 'not-text',
    reason,
    next: 'Upload the posted program itself: plain text, one block a line.',
  };
}

/** A byte order mark, or every other byte zero, as Latin text in two-byte characters has it. */
function isUtf16(head: Uint8Array): boolean {
  if (head[0] === 0xff && head[1] === 0xfe) return true;
  if (head[0] === 0xfe && head[1] === 0xff) return true;
  if (head.length < 4) return false;
  let even = 0;
  let odd = 0;
  for (let at = 0; at < head.length; at += 1) {
    if (head[at] !== 0) continue;
    if (at % 2 === 0) even += 1;
    else odd += 1;
  }
  const half = Math.floor(head.length / 2);
  return (half * 0.7 < even && odd === 0) || (half * 0.7 < odd && even === 0);
}

/** Line ends, tabs, form feeds and the flow-control and end-of-file marks of serial lines are text. */
function isStrayControl(byte: number): boolean {
  if (0x20 <= byte && byte !== 0x7f) return false;
  const isSpacing = 0x09 <= byte && byte <= 0x0d;
  const isFlowControl = 0x11 <= byte && byte <= 0x14;
  return !isSpacing && !isFlowControl && byte !== 0x1a;
}
