import { CustomChart, ScatterChart } from 'echarts/charts';
import { GeoComponent } from 'echarts/components';
import * as echarts from 'echarts/core';
import { CanvasRenderer, SVGRenderer } from 'echarts/renderers';
import { WORLD } from './map-option';
import { worldShapes } from './world';

echarts.use([CustomChart, ScatterChart, GeoComponent, CanvasRenderer, SVGRenderer]);
// Registered once under one name: maps stay in memory for ever.
echarts.registerMap(WORLD, { geoJSON: worldShapes() as never, specialAreas: {} });

export { echarts };
