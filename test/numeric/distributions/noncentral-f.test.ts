import {
  noncentralFLowerTail,
  noncentralFUpperTail,
} from '../../../src/numeric/distributions/noncentral-f.ts';
import { describeFixture } from '../fixture.ts';

describeFixture('noncentral-f', noncentralFLowerTail, noncentralFUpperTail);
