import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { modelExecutableUnidentified } from './executable-unidentified.ts';

ruleCases(modelExecutableUnidentified, {
  fires: [
    {
      name: 'nothing',
      remove: ['model.executable', 'model.source'],
      finds: { record: 'model', field: 'model.executable', level: 'block' },
    },
    {
      name: 'a note before the validation',
      remove: ['model.executable', 'model.source'],
      phase: 'calibration',
      finds: { level: 'note' },
    },
    {
      name: 'kept elsewhere without a digest',
      remove: ['model.source'],
      set: { 'model.executable': [{ path: 'bin/model', location: 'shelf 3' }] },
      finds: { record: 'model' },
    },
    {
      name: 'a container by its name only',
      remove: ['model.executable', 'model.source'],
      set: { 'model.container': { image: 'pair-of-stores:2.1' } },
      finds: { record: 'model' },
    },
    {
      name: 'a file that git does not have',
      remove: ['model.source'],
      files: { 'model/model.mjs': null },
      finds: { record: 'model' },
    },
    {
      name: 'a branch for a commit',
      remove: ['model.executable'],
      set: { 'model.source.commit': 'main' },
      finds: { record: 'model' },
    },
  ],
  silent: [
    { name: 'a source commit only', remove: ['model.executable'] },
    { name: 'a file only', remove: ['model.source'] },
    {
      name: 'kept elsewhere with its digest',
      remove: ['model.source'],
      set: { 'model.executable': [{ path: 'bin/model', sha256: 'a'.repeat(64) }] },
    },
    {
      name: 'a container digest',
      remove: ['model.executable', 'model.source'],
      set: { 'model.container': { image: 'pair-of-stores', digest: `sha256:${'0'.repeat(64)}` } },
    },
  ],
});
