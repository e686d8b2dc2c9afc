import type { Contact, Model } from '../../../manifest/data.generated.ts';
import { type Block, facts, heading, type Text } from '../document.ts';
import { notStated, words } from '../say.ts';
import type { Subject } from '../subject.ts';

/** What the study is for, where, by which model, and who answers for it. */
export function studySection({ facts: computed, verdict, key }: Subject): readonly Block[] {
  const { study = {}, catchment = {}, model = {} } = computed.manifest.data;
  const needs = (study.needs ?? []).map(({ variable = 'other', regime }) =>
    regime === undefined
      ? words(variable)
      : `${words(variable)} (${regime === 'whole' ? 'all' : regime} values)`,
  );
  const { outlet } = catchment;
  return [
    heading(1, 'Study', `${key}-study`),
    ...facts(
      ['Decision it serves', study.decision ?? notStated],
      ['Needs', needs.join(', ') || notStated],
      ['Phase', verdict.phase],
      ...(study.contacts ?? []).map((contact): [string, string] => ['Contact', contactText(contact)]),
      ['Licence', study.licence ?? notStated],
      [
        'Outlet',
        outlet === undefined
          ? null
          : `longitude ${outlet.longitude ?? '?'}, latitude ${outlet.latitude ?? '?'}`,
      ],
      ['Features', catchment.features?.join('; ')],
      ['Why this model', model.justification ?? notStated],
      ['Model', modelText(model)],
      ['Manifest', [{ code: verdict.path }]],
      ['Notes', [study.note, catchment.note, model.note].filter((note) => note !== undefined).join(' ')],
    ),
  ];
}

function contactText({ name, role, affiliation, email, orcid }: Contact): string {
  return [name, role, affiliation, email, orcid].filter((part) => part !== undefined).join(', ');
}

function modelText({ name, version, release, released, licence, source, container }: Model): Text {
  const told = [
    [name ?? notStated, release ?? version ?? ''].join(' '),
    version === undefined || version === release ? undefined : `version ${version}`,
    released === undefined ? undefined : `released ${released}`,
    licence === undefined ? undefined : `licence ${licence}`,
    source?.commit === undefined ? undefined : `source commit ${source.commit}`,
    container === undefined ? undefined : `container ${container.image} ${container.digest ?? ''}`,
  ];
  const address = source?.url ?? source?.doi;
  return [
    told.filter((part) => part !== undefined).join(', '),
    ...(address === undefined ? [] : [', ', { code: address }]),
  ];
}
