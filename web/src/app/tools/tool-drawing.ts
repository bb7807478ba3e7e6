import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Units } from '#contracts';
import type { Tool } from '#engine';
import { formatLength } from '../ui/length';
import { drawTool } from '../ui/rack-strip/draw-tool';

/** The drawing's height and width, px; the tool is scaled to fit both. */
const TALL = 340;
const WIDE = 200;
/** Room beside the tool for the dimension lines and their figures. */
const MARGIN = 96;

/** A tool in its holder to scale, hanging from the gauge line, with the lengths a check rests on. */
@Component({
  selector: 'nl-tool-drawing',
  templateUrl: './tool-drawing.html',
  styleUrl: './tool-drawing.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ToolDrawing {
  readonly tool = input.required<Tool>();
  readonly units = input.required<Units>();

  protected readonly drawing = computed(() => {
    const tool = this.tool();
    const widest = Math.max(tool.diameter, tool.holder.diameter, 1);
    const scale = Math.min(TALL / (tool.gaugeLength + tool.holder.above), WIDE / widest);
    const outlines = drawTool(tool, scale);
    const above = tool.holder.above * scale;
    const half = Math.max((widest * scale) / 2, 20);
    const face = (tool.gaugeLength - tool.stickOut) * scale;
    const tip = tool.gaugeLength * scale;
    return {
      ...outlines,
      face,
      tip,
      left: -half - 18,
      right: half + 18,
      gaugeLine: `M${-half - 16} 0H${half + 16}`,
      lengthLine: `M${half + 10} 0V${tip}m-6 0h12`,
      stickOutLine: `M${-half - 10} ${face}V${tip}m-6 0h12M${-half - 16} ${face}h12`,
      width: 2 * (half + MARGIN),
      height: above + tool.gaugeLength * scale + 40,
      viewBox: `${-half - MARGIN} ${-above - 8} ${2 * (half + MARGIN)} ${above + tool.gaugeLength * scale + 40}`,
    };
  });
  protected readonly figures = computed(() => {
    const { gaugeLength, stickOut, diameter } = this.tool();
    const units = this.units();
    return {
      gaugeLength: formatLength(gaugeLength, units, 3),
      stickOut: formatLength(stickOut, units, 3),
      diameter: `⌀ ${formatLength(diameter, units, 3)}`,
    };
  });
  protected readonly sentence = computed(() => {
    const { gaugeLength, stickOut, diameter } = this.figures();
    return `T${this.tool().number} to scale: gauge length ${gaugeLength}, stick-out ${stickOut}, ${diameter}`;
  });
}
