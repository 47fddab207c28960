export const marginPlot = (_d: object) => '<svg/>';
