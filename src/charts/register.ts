import { Chart, LinearScale, LineElement, PointElement, ScatterController, Tooltip } from 'chart.js';

/** The one place where chart.js learns what the program draws with it. */
Chart.register(ScatterController, LinearScale, LineElement, PointElement, Tooltip);

/** Takes the page's type for every chart. */
export function setChartFont(family: string): void {
  Chart.defaults.font.family = family;
  Chart.defaults.font.size = 12;
}
