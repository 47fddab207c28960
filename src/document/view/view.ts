/** Report → view: everything a template may print, as text that needs no more formatting. Users' own words are
 *  escaped here, once, before anything else is done with them. */

import { version } from '../../generated/version.ts';
import { overallLoss, proportionsOf } from '../../plan/losses.ts';
import { drivesSize } from '../../plan/plan.ts';
import type { FullReport } from '../../report.ts';
import type { DocumentKind, Study } from '../../spec/study.ts';
import { escapeMarkdown } from '../markdown/escape.ts';
import { formatCount, formatExact, formatPercent } from '../numbers.ts';
import { type AimView, aimView } from './aim-view.ts';
import { escapedStudy } from './escaped-study.ts';
import { aimsTable, stagesTable } from './study-tables.ts';
import { basisText, sentence } from './wording.ts';

const KIND_TITLES: Record<DocumentKind, string> = {
  ethics: 'Section for an ethics application',
  grant: 'Section for a grant application',
  preregistration: 'Section for a preregistration',
  protocol: 'Section for a study protocol',
  appendix: 'Appendix for reviewers',
};

export type StudyView = ReturnType<typeof buildView>;

/** What a document's kind adds to the view. */
export function kindWords(kind: DocumentKind) {
  return {
    kind,
    kindTitle: KIND_TITLES[kind],
    title: kind === 'appendix' ? 'Sample size: reviewer’s appendix' : 'Sample size',
    isAppendix: kind === 'appendix',
  };
}

/** What all documents of a study may print. */
export function buildView(given: FullReport) {
  const report = withWords(given);
  const { plan, judgements, study } = report;
  const common = {
    unit: study.sample.unit,
    counts: study.sample.counts,
    evaluable: formatCount(plan.evaluable),
    enrol: formatCount(plan.enrol),
  };
  const aims = report.sensitivities.map((sensitivity) => aimView(sensitivity, plan, study, common));
  const sizing = report.sensitivities.filter(({ plan: aim }) => drivesSize(aim.aim));
  const isMain = (aim: AimView) =>
    sizing.length === 0 || sizing.some(({ plan: one }) => one.aim.id === aim.id);
  const mainAims = aims.filter(isMain);
  return {
    ...common,
    study: studyWords(study),
    severalAims: aims.length > 1,
    severalSizing: sizing.length > 1 ? sizing.length : null,
    drivenBy: plan.drivenBy === null ? null : { id: plan.drivenBy.aim.id },
    aims,
    mainAims,
    otherAims: aims.filter((aim) => !isMain(aim)),
    doubts: mainAims.map((aim) => aim.doubt),
    assumptions: distinctAssumptions(mainAims),
    losses: study.sample.losses.map(({ stage, proportion }) => ({
      stage,
      percent: formatPercent(proportion.value),
      basis: basisText(proportion.basis),
      citation: proportion.cite.length === 0 ? null : proportion.cite,
      note: proportion.note === null ? null : sentence(proportion.note),
    })),
    retention: retentionText(study),
    stages: study.sample.losses.length === 0 ? null : stagesTable(plan, study),
    aimsTable: aimsTable(report),
    shortfall:
      plan.shortfall === null
        ? null
        : { maximum: formatCount(plan.shortfall.maximum), evaluable: formatCount(plan.shortfall.evaluable) },
    maximum: study.sample.maximum === null ? null : formatCount(study.sample.maximum),
    recruitment: recruitmentWords(study, plan.enrol),
    missingData: study.sample.missingData === null ? null : sentence(study.sample.missingData),
    multiplicity: multiplicityText(study),
    judgements: judgements.map(({ rule, level, aim, message, acknowledged }) => ({
      rule,
      level,
      aim,
      message: escapeMarkdown(message),
      acknowledged: acknowledged === null ? null : escapeMarkdown(acknowledged),
    })),
    pointsToAppendix: study.documents.some((document) => document.kind === 'appendix'),
    software: { name: 'Samplecase', version, hash: study.hash, shortHash: study.hash.slice(0, 12) },
  };
}

/** The report with every text of its author escaped, in the aims of the plan as well. */
function withWords(report: FullReport): FullReport {
  const study = escapedStudy(report.study);
  const escapedAim = <Plan extends { aim: { index: number } }>(plan: Plan): Plan => ({
    ...plan,
    aim: study.aims[plan.aim.index] ?? plan.aim,
  });
  return {
    ...report,
    study,
    plan: {
      ...report.plan,
      aims: report.plan.aims.map(escapedAim),
      drivenBy: report.plan.drivenBy && escapedAim(report.plan.drivenBy),
    },
    sensitivities: report.sensitivities.map((one) => ({ ...one, plan: escapedAim(one.plan) })),
  };
}

function studyWords(study: Study) {
  return {
    title: study.title,
    question: sentence(study.question),
    population: sentence(study.population),
    design: sentence(study.design),
    burden: study.burden === null ? null : sentence(study.burden),
    reviewer: study.reviewer,
  };
}

/** '.85 · .96', the divisor of the number analysed. */
function retentionText(study: Study): string {
  return proportionsOf(study.sample.losses)
    .map((loss) => formatExact(1 - overallLoss([loss])).replace(/^0\./, '.'))
    .map((kept) => kept)
    .join(' · ');
}

function recruitmentWords({ sample: { recruitment } }: Study, enrol: number) {
  if (recruitment === null) return null;
  const { sites, eligiblePerMonth, consent, months, startUpMonths } = recruitment;
  const monthly = sites * eligiblePerMonth * consent;
  return {
    sites,
    eligible: formatExact(eligiblePerMonth),
    consent: consent === 1 ? null : formatPercent(consent),
    needed: formatCount(Math.ceil(enrol / monthly)),
    startUp: startUpMonths === 0 ? null : startUpMonths,
    months: formatExact(months),
  };
}

function multiplicityText(study: Study): string | null {
  const primary = study.aims.filter(({ role }) => role === 'primary').length;
  if (primary < 2) return null;
  if (study.primaryAims === 'all') {
    return `The study succeeds only if all ${primary} primary aims do, so the significance level of each is not divided.`;
  }
  if (study.primaryAims === 'any') {
    return `The study succeeds if any of its ${primary} primary aims does; the significance levels stated are those after division among them.`;
  }
  return null;
}

function distinctAssumptions(aims: readonly AimView[]) {
  const all = aims.flatMap((aim) => aim.method.assumptions);
  return all.filter((one, index) => all.findIndex((other) => other.statement === one.statement) === index);
}
