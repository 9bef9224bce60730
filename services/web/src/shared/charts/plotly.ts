import createPlotlyComponent from 'react-plotly.js/factory';
import Plotly from 'plotly.js-dist-min';

/** Loaded with the first chart and never before: the library is larger than all the rest. */
export const PlotlyChart = createPlotlyComponent(Plotly);
