import {
  squaredMultipleCorrelationLowerTail,
  squaredMultipleCorrelationUpperTail,
} from '../../../src/numeric/distributions/squared-multiple-correlation.ts';
import { describeFixture } from '../fixture.ts';

describeFixture(
  'squared-multiple-correlation',
  squaredMultipleCorrelationLowerTail,
  squaredMultipleCorrelationUpperTail,
);
