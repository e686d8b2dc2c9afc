import { keysBelow, valueAt } from '../../records/field.ts';
import type { RecordNode } from '../../records/record.ts';
import type { RecordSummary } from '../../verdict/finding.ts';
import type { DossierStudy } from '../content.ts';
import type { Framework, FrameworkElement } from '../frameworks/framework.ts';
import { frameworks as published } from '../frameworks/index.ts';

/** A framework laid beside one study. */
export interface Crosswalk extends Omit<Framework, 'elements'> {
  readonly elements: readonly ElementAnswers[];
}

export interface ElementAnswers extends Omit<FrameworkElement, 'answered_by'> {
  /** Empty where the study says nothing to it. */
  readonly answers: readonly Answer[];
}

/** A record that answers an element. */
export interface Answer extends Pick<RecordSummary, 'state' | 'grade'> {
  readonly record: string;
  /** The fields that do, from the record on, such as `source` or `scores.validation`; empty for the record as a whole. */
  readonly fields: readonly string[];
}

/** Where a study answers each element of the published frameworks, and of those of its own. */
export function crosswalksOf(study: DossierStudy): readonly Crosswalk[] {
  return [...published, ...study.frameworks].map(({ elements, ...framework }) => ({
    ...framework,
    elements: elements.map(({ answered_by, ...element }) => ({
      ...element,
      answers: answersIn(study, answered_by),
    })),
  }));
}

function answersIn({ facts, verdict }: DossierStudy, addresses: readonly string[]): readonly Answer[] {
  const states = new Map(verdict.records.map((record) => [record.id, record]));
  return [...facts.records.nodes.values()].flatMap((node) => {
    const asked = addresses.filter((address) => address.split('.')[0] === node.area);
    const fields = asked.flatMap((address) => {
      const keys = keysBelow(node.area, address);
      return isAnswered(keys, node, facts.manifest.data) ? [keys.join('.')] : [];
    });
    const { state = 'missing', grade = null } = states.get(node.id) ?? {};
    return fields.length === 0 ? [] : [{ record: node.id, fields: fields.filter(Boolean), state, grade }];
  });
}

/** The conditions of all scenarios stand beside the cases that rest on them. */
function isAnswered(keys: readonly string[], node: RecordNode, data: object): boolean {
  const holder =
    node.area === 'scenarios' && keys[0] === 'conditions' ? valueAt(data, ['scenarios']) : node.fragment;
  const value = valueAt(holder, keys);
  return typeof value === 'object' && value !== null ? Object.keys(value).length > 0 : value !== undefined;
}
