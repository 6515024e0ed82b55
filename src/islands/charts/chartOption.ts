import type { CustomSeriesOption, LineSeriesOption, ScatterSeriesOption } from 'echarts/charts';
import type { GridComponentOption, TooltipComponentOption } from 'echarts/components';
import type { ComposeOption } from 'echarts/core';

/** Everything that our charts are made of; the renderer registers no more than this. */
export type ChartOption = ComposeOption<
  | LineSeriesOption
  | ScatterSeriesOption
  | CustomSeriesOption
  | GridComponentOption
  | TooltipComponentOption
>;

export type ChartSeries = LineSeriesOption | ScatterSeriesOption | CustomSeriesOption;
