/** Published tables of required numbers for the overall F test, with the exact numbers beside them. The published ones
 *  are from memory unless said otherwise; the exact ones were computed outside this project from base distribution
 *  functions (SciPy), as the smallest n at which the noncentral F with λ = f²·n reaches the power. */

/** Cohen (1992), table 2, multiple correlation, power .80: [alpha, predictors, printed n, exact n] for f² .02, .15, .35.
 *  The printed numbers come from rounded noncentralities of 1988 and differ by up to 5, in either direction. */
export const COHEN_1992: readonly [number, number, readonly number[], readonly number[]][] = [
  [0.01, 2, [698, 97, 45], [699, 98, 45]],
  [0.01, 3, [780, 108, 50], [779, 109, 51]],
  [0.01, 4, [841, 118, 55], [845, 119, 55]],
  [0.01, 5, [901, 126, 59], [902, 127, 59]],
  [0.01, 6, [953, 134, 63], [953, 135, 63]],
  [0.01, 7, [998, 141, 66], [999, 142, 67]],
  [0.01, 8, [1039, 147, 69], [1042, 148, 70]],
  [0.05, 2, [481, 67, 30], [485, 68, 31]],
  [0.05, 3, [547, 76, 34], [550, 77, 36]],
  [0.05, 4, [599, 84, 38], [602, 85, 40]],
  [0.05, 5, [645, 91, 42], [647, 92, 43]],
  [0.05, 6, [686, 97, 45], [688, 98, 46]],
  [0.05, 7, [726, 102, 48], [725, 103, 49]],
  [0.05, 8, [757, 107, 50], [759, 109, 52]],
  [0.1, 2, [390, 54, 24], [388, 54, 25]],
  [0.1, 3, [444, 62, 28], [444, 62, 29]],
  [0.1, 4, [492, 69, 31], [489, 69, 32]],
  [0.1, 5, [531, 75, 34], [527, 75, 35]],
  [0.1, 6, [563, 79, 37], [562, 80, 38]],
  [0.1, 7, [592, 83, 39], [594, 85, 41]],
  [0.1, 8, [618, 87, 41], [623, 90, 43]],
];

export const COHEN_1992_F2 = [0.02, 0.15, 0.35];

export const GREEN_1991_PREDICTORS = [1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 15, 20, 30, 40];

/** Green (1991), the table that compares rules of thumb with numbers from power, alpha .05, power .80. The printed 844
 *  for ten predictors breaks its column (788, 844, 952; exact 791, 822, 954): a slip of interpolation or printing. */
export const GREEN_1991 = [
  {
    f2: 0.02,
    r2: 0.02,
    printed: [390, 481, 547, 599, 645, 686, 726, 757, 788, 844, 952, 1066, 1247, 1407],
    fixedF2: [395, 485, 550, 602, 647, 688, 725, 759, 791, 822, 954, 1064, 1250, 1406],
    fixedR2: [387, 476, 539, 590, 635, 674, 711, 744, 776, 806, 935, 1043, 1225, 1379],
    sampledR2: [390, 478, 541, 593, 637, 677, 714, 747, 779, 808, 938, 1046, 1228, 1382],
  },
  {
    f2: 0.15,
    r2: 0.13,
    printed: [53, 66, 76, 84, 91, 97, 102, 108, 113, 117, 138, 156, 187, 213],
    fixedF2: [55, 68, 77, 85, 92, 98, 103, 109, 114, 118, 139, 157, 187, 214],
    fixedR2: [55, 68, 77, 85, 92, 98, 104, 109, 114, 119, 139, 157, 188, 214],
    sampledR2: [58, 71, 80, 88, 95, 101, 106, 112, 117, 121, 142, 160, 190, 217],
  },
  {
    f2: 0.35,
    r2: 0.26,
    printed: [24, 30, 35, 39, 42, 46, 48, 51, 54, 56, 67, 77, 94, 110],
    fixedF2: [25, 31, 36, 40, 43, 46, 49, 52, 54, 57, 68, 77, 95, 110],
    fixedR2: [25, 31, 36, 40, 43, 46, 49, 52, 54, 57, 68, 77, 94, 110],
    sampledR2: [27, 34, 38, 42, 45, 48, 51, 54, 56, 59, 70, 79, 97, 112],
  },
];

/** Gatsonis & Sampson (1989) advise to add five to the number for fixed predictors: [R², predictors, fixed, sampled], both
 *  exact, alpha .05, power .80. */
export const ADD_FIVE: readonly [number, number, number, number][] = [
  [0.02, 1, 387, 390],
  [0.02, 2, 476, 478],
  [0.02, 5, 635, 637],
  [0.02, 10, 806, 808],
  [0.13, 1, 55, 58],
  [0.13, 2, 68, 71],
  [0.13, 5, 92, 95],
  [0.13, 10, 119, 121],
  [0.26, 1, 25, 27],
  [0.26, 2, 31, 34],
  [0.26, 5, 43, 45],
  [0.26, 10, 57, 59],
];
