import {
  noncentralChiSquaredLowerTail,
  noncentralChiSquaredUpperTail,
} from '../../../src/numeric/distributions/noncentral-chi-squared.ts';
import { describeFixture } from '../fixture.ts';

describeFixture('noncentral-chi-squared', noncentralChiSquaredLowerTail, noncentralChiSquaredUpperTail);
