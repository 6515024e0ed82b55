import type { GridComponentOption } from 'echarts/components';
import type { ChartTheme } from './chartTheme';
import { niceScale } from './niceScale';
import { tickWriter } from './plotNumber';

/** A linear axis: exact ends, and ticks only where they fall on round numbers. */
export interface AxisPlan {
  /** Quantity with its unit. */
  name: string;
  min: number;
  max: number;
  ticks: number[];
}

/** Round ticks inside an exact range. */
export function planAxis(name: string, min: number, max: number, steps: number): AxisPlan {
  const { min: first, interval } = niceScale(min, max, steps);
  const ticks: number[] = [];
  for (let index = 0; ; index += 1) {
    const tick = Number((first + index * interval).toPrecision(12));
    if (tick > max + interval * 1e-6) break;
    if (tick >= min - interval * 1e-6) ticks.push(tick);
  }
  return { name, min, max, ticks };
}

interface AxisLook {
  theme: ChartTheme;
  format?: (value: number) => string;
  /** Draws the line at the bottom (or left) of the plot and not at the other axis's zero. */
  onZero?: boolean;
}

function common(
  plan: AxisPlan,
  { theme, format = tickWriter(plan.ticks), onZero = false }: AxisLook,
) {
  return {
    type: 'value' as const,
    min: plan.min,
    max: plan.max,
    axisLine: { show: true, onZero, lineStyle: { color: theme.quiet, width: 1 } },
    axisTick: {
      show: true,
      length: 4,
      lineStyle: { color: theme.quiet, width: 1 },
      customValues: plan.ticks,
    },
    axisLabel: {
      color: theme.quiet,
      fontSize: 12,
      fontFamily: theme.fontFamily,
      margin: 8,
      customValues: plan.ticks,
      formatter: format,
    },
    splitLine: { show: false },
    name: plan.name,
    nameTextStyle: { color: theme.quiet, fontSize: 12, fontFamily: theme.fontFamily },
    axisPointer: { show: false },
  };
}

/** The horizontal axis; its name stands under its right end. */
export function bottomAxis(plan: AxisPlan, look: AxisLook) {
  const base = common(plan, look);
  return {
    ...base,
    position: 'bottom' as const,
    nameLocation: 'middle' as const,
    nameGap: 30,
  };
}

/** The vertical axis; its name stands level above it, where it is read without turning the head. */
export function leftAxis(plan: AxisPlan, look: AxisLook) {
  const base = common(plan, look);
  return {
    ...base,
    position: 'left' as const,
    nameLocation: 'end' as const,
    nameGap: 14,
    nameTextStyle: { ...base.nameTextStyle, align: 'left' as const, padding: [0, 0, 0, -44] },
  };
}

/** Room for what stands around the plot. */
export function gridWithin(margins: {
  top?: number;
  right: number;
  bottom?: number;
  left?: number;
}): GridComponentOption {
  const { top = 34, right, bottom = 48, left = 52 } = margins;
  return { top, right, bottom, left, containLabel: false };
}

/** A tooltip painted by the chart itself, since the page's policy allows no foreign markup. */
export function paintedTooltip(theme: ChartTheme) {
  return {
    trigger: 'item' as const,
    renderMode: 'richText' as const,
    confine: true,
    transitionDuration: 0,
    backgroundColor: theme.sheet,
    borderColor: theme.quiet,
    borderWidth: 1,
    borderRadius: 3,
    padding: [6, 10],
    textStyle: { color: theme.ink, fontSize: 12, lineHeight: 18, fontFamily: theme.fontFamily },
    shadowBlur: 0,
    shadowColor: 'transparent',
    shadowOffsetX: 0,
    shadowOffsetY: 0,
  };
}
