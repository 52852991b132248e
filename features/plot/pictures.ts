// One module, fetched when the first figure is drawn: so the drawing library and the plots weigh on no other page.
export { OrbitPlot } from './orbit-plot';
export { SectionPlot } from './section-plot';
export { SectionSheet } from './section-sheet';
export { TimePlot } from './time-plot';
export { UnitCircle } from './unit-circle';
