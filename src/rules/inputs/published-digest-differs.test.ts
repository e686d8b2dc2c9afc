import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { inputsPublishedDigestDiffers } from './published-digest-differs.ts';

const wrong = '0'.repeat(64);
/** SHA-256 of `abc`: FIPS 180-4, first example of the algorithm. */
const abc = 'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad';

ruleCases(inputsPublishedDigestDiffers, {
  fires: [
    {
      name: 'one file',
      set: { 'inputs.rainfall.source.published_sha256': wrong },
      phase: 'setup',
      finds: {
        record: 'inputs.rainfall',
        field: 'inputs.rainfall.files[0]',
        subject: 'data/rain.csv',
        stated: wrong,
        level: 'block',
      },
    },
    {
      name: 'by path',
      set: { 'inputs.rainfall.source.published_sha256': { 'data/rain.csv': wrong } },
      finds: { subject: 'data/rain.csv' },
    },
    {
      name: 'one digest for several files, none of which has it',
      set: {
        'inputs.rainfall.files': ['data/rain.csv', 'data/check.csv'],
        'inputs.rainfall.source.published_sha256': wrong,
      },
      finds: { field: 'inputs.rainfall.source.published_sha256', message: 'None of the 2 files' },
    },
    {
      name: 'a file kept elsewhere',
      set: {
        'inputs.rainfall.files': [{ path: 'rain.nc', sha256: 'a'.repeat(64), published_sha256: wrong }],
      },
      finds: { subject: 'rain.nc', found: 'a'.repeat(64) },
    },
  ],
  silent: [
    {
      name: 'the same',
      files: { 'data/rain.csv': 'abc' },
      set: { 'inputs.rainfall.source.published_sha256': abc },
    },
    {
      name: 'one of several has it',
      files: { 'data/rain.csv': 'abc' },
      set: {
        'inputs.rainfall.files': ['data/rain.csv', 'data/check.csv'],
        'inputs.rainfall.source.published_sha256': abc,
      },
    },
    {
      name: 'not of the script that prepares it',
      set: { 'inputs.rainfall.source.published_sha256': { 'data/prepare.mjs': wrong } },
    },
  ],
});
