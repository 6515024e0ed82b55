import ReactEChartsCore from 'echarts-for-react/esm/core';
import { CustomChart, LineChart, ScatterChart } from 'echarts/charts';
import { GridComponent, TooltipComponent } from 'echarts/components';
import * as echarts from 'echarts/core';
import { SVGRenderer } from 'echarts/renderers';
import type { ChartOption } from './chartOption';

echarts.use([CustomChart, LineChart, ScatterChart, GridComponent, TooltipComponent, SVGRenderer]);

const options = { renderer: 'svg' as const };

export interface ChartCanvasProps {
  option: ChartOption;
  height: number;
  /** Name of the clicked point, for points that carry one. */
  onPick?: ((name: string) => void) | undefined;
}

/** The drawing itself; the only module that loads the chart library. */
export function ChartCanvas({ option, height, onPick }: ChartCanvasProps) {
  return (
    <ReactEChartsCore
      echarts={echarts}
      option={option}
      notMerge
      opts={options}
      style={{ height, width: '100%' }}
      {...(onPick ? { onEvents: pickEvents(onPick) } : {})}
    />
  );
}

function pickEvents(onPick: (name: string) => void) {
  return {
    click: (point: { name?: unknown }) => {
      if (typeof point.name === 'string' && point.name !== '') onPick(point.name);
    },
  };
}
