export const powerCurve = (_d: object) => '<svg/>';
