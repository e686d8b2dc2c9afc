import type { JointPoint, JointReach } from '../../facts/conditions/reach.ts';
import { isDefined } from '../../hydrology/paired.ts';
import { few, figure } from '../figures.ts';
import { rule } from '../rule.ts';

export const scenariosBeyondJointly = rule({
  id: 'scenarios.beyond-jointly',
  scope: 'scenarios',
  from: 'warn',
  means: null,
  acceptable: true,
  statement:
    'A scenario lies inside the calibrated range of every single driver, but outside of what calibration held of them together (Mahalanobis distance, leverage, convex hull of up to three drivers), in its mean or in more years than the limit; or the drivers depend on each other, so that this can’t be told.',
  why: 'A warm year and a wet year may both have been calibrated on, and a warm wet year never. Inside every range is not inside the joint domain.',
  source: {
    basis: 'published',
    citation:
      'Hull as the test of extrapolation: King, G. & Zeng, L. (2006) Political Analysis 14:131-159 (from memory); leverage: Sahigara, F. et al. (2012) Molecules 17:4791-4810 (number from memory). For single years the hull is not asked, as with few calibrated years nearly every new one lies outside it; the share of years is our own choice',
  },
  clear:
    'Look at the years named; say in the case’s note, or under `accepts`, why the model holds for this combination, or calibrate on a longer record.',
  limits: {
    joint_years_share: {
      default: 0.2,
      unit: '1',
      states: 'share of a scenario’s years that may lie inside every range and outside the joint domain',
      looser: 'higher',
    },
  },
  check: ({ id, name, field, fragment }, { scenarios }, { joint_years_share = 0.2 }) => {
    const joint = scenarios.cases.get(id)?.joint;
    const common = { record: id, field: [...field, 'drivers'] };
    if (joint === undefined || Object.keys(fragment.drivers ?? {}).length < 2) return [];
    if (!isDefined(joint)) {
      const known = [...(scenarios.cases.get(id)?.drivers.values() ?? [])];
      // What can't be computed at all, or not by the year, is no matter of their dependence.
      if (!known.every(({ reach }) => isDefined(reach)) || /^fewer than two/.test(joint.undefined)) return [];
      return [
        {
          ...common,
          subject: 'undefined',
          message: `How far scenario ${name} reaches in all drivers together is undefined: ${joint.undefined}.`,
          clear: 'Leave out a driver that follows from the others, or calibrate on more years.',
        },
      ];
    }
    const { mean, years, drivers, calibratedYears } = joint.value;
    const beyond = years.filter((year) => year.isInEveryRange && isBeyond(year));
    const isMeanBeyond = mean.isInEveryRange && (isBeyond(mean) || hullOf(mean) > 0);
    if (!isMeanBeyond && beyond.length <= joint_years_share * years.length) return [];
    const together = drivers.map((driver) => driver.replaceAll('_', ' ')).join(' and ');
    return [
      {
        ...common,
        subject: 'joint',
        message: isMeanBeyond
          ? `In its mean, scenario ${name} lies inside the calibrated range of every driver, but the combination of ${together} lies outside of what calibration held.`
          : `${beyond.length} of ${years.length} years of scenario ${name} lie inside the calibrated range of every driver, but combine ${together} as no calibrated year does.`,
        detail: [
          `${calibratedYears} calibrated years; mean of the scenario: ${inWords(mean)}`,
          ...(beyond.length > 0 ? [`years: ${few(beyond.map(ofYear), 4)}`] : []),
        ],
      },
    ];
  },
});

/** Mahalanobis and leverage are one test on two scales, with a limit each. */
function isBeyond({ squared, limit, leverage, leverageLimit }: JointPoint): boolean {
  return squared > limit || leverage > leverageLimit * (1 + 1e-9);
}

function hullOf({ hull }: JointPoint): number {
  return isDefined(hull) ? hull.value : 0;
}

function ofYear({ label, squared, leverage }: JointReach['mean']): string {
  return `${label} (distance squared ${figure(squared)}, leverage ${figure(leverage)})`;
}

function inWords({ squared, limit, leverage, leverageLimit, hull }: JointPoint): string {
  const hullSaid = isDefined(hull)
    ? hull.value === 0
      ? 'inside the convex hull'
      : `${figure(hull.value)} standard deviations outside the convex hull`
    : `hull undefined (${hull.undefined})`;
  return `Mahalanobis distance squared ${figure(squared)} (limit ${figure(limit)}), leverage ${figure(leverage)} (limit ${figure(leverageLimit)}), ${hullSaid}`;
}
