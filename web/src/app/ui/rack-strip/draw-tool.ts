import type { Tool } from '#engine';

/**
 * A tool in its holder as outlines for SVG: pixels, x from the axis, y downward from the gauge line.
 * Diameters and lengths are to scale; the taper's flanks, chamfers and flute lines are drawn, not measured.
 */
export interface ToolDrawing {
  /** Taper and pull stud over the gauge line, an open outline. */
  readonly taper: string;
  readonly holder: string;
  readonly shank: string;
  readonly cutter: string;
  /** Flute lines on the cutter; empty where the kind has none. */
  readonly flutes: string;
  /** Where the tip is. */
  readonly bottom: number;
  readonly width: number;
}

/** Slenderest line still seen on a screen (px): a 1 mm drill must not vanish. */
const LEAST_WIDTH = 1.5;
const CHAMFER = 4;
const FLUTE_PITCH = 6;
/** Half of the 118° point that twist drills commonly have (common practice). */
const DRILL_HALF_POINT = (59 * Math.PI) / 180;

export function drawTool(tool: Tool, scale: number): ToolDrawing {
  const face = (tool.gaugeLength - tool.stickOut) * scale;
  const tip = tool.gaugeLength * scale;
  const fluteTop = Math.max(face, tip - tool.fluteLength * scale);
  const cutter = cutterOf(tool, scale, fluteTop, tip);
  return {
    taper: taperOf(tool, scale),
    holder: holderOf(tool, scale, face),
    shank: fluteTop - face > 0.1 ? box(atLeast(tool.shank * scale), face, fluteTop) : '',
    cutter: cutter.outline,
    flutes: cutter.flutes,
    bottom: tip,
    width: Math.max(tool.diameter, tool.holder.diameter) * scale,
  };
}

function taperOf(tool: Tool, scale: number): string {
  const above = tool.holder.above * scale;
  if (above < 2) return '';
  const base = tool.holder.diameter * scale * 0.34;
  const small = base * 0.58;
  const stud = above * 0.3;
  const neck = small * 0.45;
  const head = small * 0.72;
  const top = -above;
  return (
    `M${px(-base)} 0L${px(-small)} ${px(top + stud)}H${px(small)}L${px(base)} 0` +
    `M${px(-neck)} ${px(top + stud)}V${px(top + stud * 0.4)}H${px(-head)}V${px(top)}` +
    `H${px(head)}V${px(top + stud * 0.4)}H${px(neck)}V${px(top + stud)}`
  );
}

function holderOf(tool: Tool, scale: number, face: number): string {
  const steps =
    tool.holder.steps.length > 0
      ? tool.holder.steps
      : [{ diameter: tool.holder.diameter, length: tool.gaugeLength - tool.stickOut }];
  let y = 0;
  let path = '';
  steps.forEach((step, index) => {
    const last = index === steps.length - 1;
    const to = last ? face : y + step.length * scale;
    const half = (step.diameter * scale) / 2;
    const cut = last ? Math.min(CHAMFER, half / 2, Math.max(0, to - y) / 2) : 0;
    path +=
      `M${px(-half)} ${px(y)}H${px(half)}V${px(to - cut)}L${px(half - cut)} ${px(to)}` +
      `H${px(cut - half)}L${px(-half)} ${px(to - cut)}Z`;
    y = to;
  });
  return path;
}

interface Cutter {
  readonly outline: string;
  readonly flutes: string;
}

function cutterOf(tool: Tool, scale: number, top: number, tip: number): Cutter {
  const width = atLeast(tool.diameter * scale);
  const half = width / 2;
  switch (tool.kind) {
    case 'ball': {
      const shoulder = Math.max(top, tip - half);
      return {
        outline:
          `M${px(-half)} ${px(top)}H${px(half)}V${px(shoulder)}` +
          `A${px(half)} ${px(tip - shoulder)} 0 0 1 ${px(-half)} ${px(shoulder)}Z`,
        flutes: slanted(half, top, shoulder, 1),
      };
    }
    case 'drill': {
      const shoulder = Math.max(top, tip - half / Math.tan(DRILL_HALF_POINT));
      return {
        outline: pointed(half, top, shoulder, tip),
        flutes: slanted(half, top, shoulder, 1),
      };
    }
    case 'v-bit':
      return { outline: pointed(half, top, top, tip), flutes: '' };
    case 'knife':
      return {
        outline: `M${px(-half)} ${px(top)}H${px(half)}V${px((top + tip) / 2)}L${px(-half)} ${px(tip)}Z`,
        flutes: '',
      };
    case 'probe':
      return { outline: stylus(tool, scale, top, tip), flutes: '' };
    case 'compression': {
      // The tip cuts upward, the part above it downward: the two slants meet.
      const meet = tip - (tip - top) * 0.35;
      return {
        outline: box(width, top, tip),
        flutes: slanted(half, top, meet, -1) + slanted(half, meet, tip, 1),
      };
    }
    case 'downcut':
      return { outline: box(width, top, tip), flutes: slanted(half, top, tip, -1) };
    case 'end-mill':
    case 'upcut':
    case 'surfacing':
      return { outline: box(width, top, tip), flutes: slanted(half, top, tip, 1) };
    default:
      return { outline: box(width, top, tip), flutes: '' };
  }
}

function stylus(tool: Tool, scale: number, top: number, tip: number): string {
  const half = atLeast(tool.diameter * scale) / 2;
  const stem = Math.max(LEAST_WIDTH, half * 0.8);
  return (
    box(stem, top, Math.max(top, tip - half)) +
    `M${px(-half)} ${px(tip - half)}a${px(half)} ${px(half)} 0 1 0 ${px(2 * half)} 0` +
    `a${px(half)} ${px(half)} 0 1 0 ${px(-2 * half)} 0Z`
  );
}

function pointed(half: number, top: number, shoulder: number, tip: number): string {
  return `M${px(-half)} ${px(top)}H${px(half)}V${px(shoulder)}L0 ${px(tip)}L${px(-half)} ${px(shoulder)}Z`;
}

function box(width: number, top: number, bottom: number): string {
  return `M${px(-width / 2)} ${px(top)}H${px(width / 2)}V${px(bottom)}H${px(-width / 2)}Z`;
}

/** Lines across the cutter, rising to the right (1) or falling (-1), all within top and bottom. */
function slanted(half: number, top: number, bottom: number, direction: 1 | -1): string {
  const rise = Math.min(FLUTE_PITCH, half * 1.2);
  let lines = '';
  for (let y = bottom - 2; y - rise >= top; y -= FLUTE_PITCH) {
    const [left, right] = direction === 1 ? [y, y - rise] : [y - rise, y];
    lines += `M${px(-half)} ${px(left)}L${px(half)} ${px(right)}`;
  }
  return lines;
}

function atLeast(width: number): number {
  return Math.max(LEAST_WIDTH, width);
}

/** Two decimals are a fiftieth of what a screen can show, and keep the markup small. */
function px(value: number): string {
  return String(Math.round(value * 100) / 100);
}
