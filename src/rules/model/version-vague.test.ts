import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { modelVersionVague } from './version-vague.ts';

const vague = ['latest', 'current', 'dev', 'main', 'HEAD', '2024', 'feature/snow', '2.1-SNAPSHOT'];
const exact = ['2.1', '2024.1', 'v3', 'r664', '2.1.0-beta.2', '3fa94c1', '2021-05-04'];

ruleCases(modelVersionVague, {
  fires: [
    ...vague.map((version) => ({
      name: `version ${version}`,
      set: { 'model.version': version },
      finds: { record: 'model', field: 'model.version', stated: version, level: 'block' as const },
    })),
    {
      name: 'both',
      set: { 'model.version': 'latest', 'model.release': '2020' },
      finds: [
        { subject: 'version', message: 'whatever is newest' },
        { subject: 'release', message: 'the year 2020 only' },
      ],
    },
  ],
  silent: [
    ...exact.map((version) => ({ name: `version ${version}`, set: { 'model.version': version } })),
    { name: 'none stated', remove: ['model.version', 'model.release'] },
  ],
});
