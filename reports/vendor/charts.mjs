// The parts of Apache ECharts that the report page draws with.
import * as echarts from 'echarts/core';
import {CustomChart, LineChart, ScatterChart} from 'echarts/charts';
import {
  AriaComponent, GridComponent, MarkLineComponent, TooltipComponent
} from 'echarts/components';
import {SVGRenderer} from 'echarts/renderers';

echarts.use([
  AriaComponent, CustomChart, GridComponent, LineChart, MarkLineComponent,
  ScatterChart, SVGRenderer, TooltipComponent
]);
globalThis.echarts = {init: echarts.init};
