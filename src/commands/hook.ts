import { openRepository, type Repository } from '../repository/repository.ts';
import type { Context, ExitStatus } from './command.ts';
import { addHooks } from './hook/add.ts';
import { removeHooks } from './hook/remove.ts';
import { type HookReport, listHooks } from './hook/report.ts';
import type { HookName } from './hook/script.ts';
import { describeHooks } from './hook/text.ts';

/** `stoplog hook add`: writes the hooks and says what it did. */
export const hookAdd = (
  context: Context,
  { for: hook, base }: { readonly for?: HookName; readonly base?: string } = {},
) =>
  run(context, (repository) =>
    addHooks(repository, {
      ...(hook === undefined ? {} : { hooks: [hook] }),
      ...(base === undefined ? {} : { base }),
    }),
  );

/** `stoplog hook remove`: takes them away and says what is back. */
export const hookRemove = (context: Context) => run(context, removeHooks);

/** `stoplog hook list`: says what is there. */
export const hookList = (context: Context) => run(context, listHooks);

async function run(
  context: Context,
  action: (repository: Repository) => Promise<HookReport>,
): Promise<ExitStatus> {
  const repository = await openRepository(context.cwd, context.environment);
  context.write(describeHooks(await action(repository), repository.cwd));
  return 0;
}
