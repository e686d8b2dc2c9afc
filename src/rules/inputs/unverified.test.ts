import { ruleCases } from '../../../tests/harness/rule-cases.ts';
import { inputsUnverified } from './unverified.ts';

/** As Git LFS writes it: git-lfs.com, specification of the pointer file, version 1. */
const pointer = `version https://git-lfs.github.com/spec/v1\noid sha256:${'4'.repeat(64)}\nsize 12345\n`;

ruleCases(inputsUnverified, {
  fires: [
    {
      name: 'a Git LFS pointer without its content',
      files: { 'data/rain.csv': pointer },
      finds: {
        record: 'inputs.rainfall',
        field: 'inputs.rainfall.files[0]',
        subject: 'data/rain.csv',
        message: 'Git LFS pointer',
        level: 'warn',
      },
    },
    {
      name: 'in an archive',
      files: { 'data/rain.csv': pointer },
      phase: 'archive',
      finds: { level: 'block' },
    },
    {
      name: 'outputs of a run, too',
      files: { 'runs/dry/daily.csv': pointer },
      finds: { record: 'runs.dry' },
    },
    {
      name: 'kept elsewhere',
      set: { 'inputs.terrain.files': [{ path: 'dem.tif', sha256: 'a'.repeat(64), location: 'shelf 3' }] },
      finds: {
        record: 'inputs.terrain',
        subject: 'dem.tif',
        message: /shelf 3.*could not be checked/,
        level: 'warn',
      },
    },
    {
      name: 'kept elsewhere without a digest',
      set: { 'inputs.terrain.files': [{ path: 'dem.tif' }] },
      finds: { message: 'without its SHA-256, so nothing identifies it', clear: 'named by its path alone' },
    },
    {
      name: 'a link that leads nowhere',
      files: { 'data/dem.asc': { link: 'gone.asc' } },
      finds: { record: 'inputs.terrain', message: 'leads nowhere', clear: 'in place of the link' },
    },
    {
      name: 'kept elsewhere, and another file at its path',
      set: { 'inputs.terrain.files': [{ path: 'dem.tif', sha256: 'a'.repeat(64) }] },
      beside: { 'dem.tif': { sha256: 'b'.repeat(64), bytes: 3 } },
      phase: 'setup',
      finds: { stated: 'a'.repeat(64), found: 'b'.repeat(64), level: 'block' },
    },
  ],
  silent: [
    {
      name: 'kept elsewhere, and the same file at its path',
      set: { 'inputs.terrain.files': [{ path: 'dem.tif', sha256: 'a'.repeat(64) }] },
      beside: { 'dem.tif': { sha256: 'a'.repeat(64), bytes: 3 } },
    },

    { name: 'a link inside the repository', files: { 'data/dem.asc': { link: '../model/pond.txt' } } },
  ],
});
