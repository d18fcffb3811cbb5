import { CustomChart, LineChart } from 'echarts/charts';
import { DataZoomComponent, GridComponent } from 'echarts/components';
import { use } from 'echarts/core';
import { CanvasRenderer } from 'echarts/renderers';

use([CustomChart, LineChart, DataZoomComponent, GridComponent, CanvasRenderer]);

// Only what ngx-echarts needs: `export * from 'echarts/core'` would keep the whole core namespace.
export { init } from 'echarts/core';
