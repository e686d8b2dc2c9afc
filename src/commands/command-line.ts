import { Argument, Command, CommanderError, Option } from 'commander';
import { Failure } from '../failure.ts';
import { caution } from '../reports/caution.ts';
import { wrap } from '../reports/wrap.ts';
import { phases } from '../rules/rule.ts';
import { version } from '../version.ts';
import { checkCommand } from './check.ts';
import type { Context, ExitStatus } from './command.ts';
import type { DossierOptions } from './dossier.ts';
import { hookNames } from './hook/script.ts';
import { hookAdd, hookList, hookRemove } from './hook.ts';
import { hosts, pipelineCommand } from './pipeline.ts';
import { kinds } from './report-kinds.ts';
import { rulesCommand } from './rules.ts';
import { sealCommand } from './seal.ts';

/** Reads the command line, runs the command, returns the exit status. Throws a Failure for what could not be done. */
export async function runCommandLine(words: readonly string[], context: Context): Promise<ExitStatus> {
  let status: ExitStatus = 0;
  const run =
    <Given extends unknown[]>(action: (context: Context, ...given: Given) => Promise<ExitStatus>) =>
    async (...given: Given): Promise<void> => {
      status = await action(context, ...given);
    };
  const program = describe(run);
  for (const one of [program, ...program.commands.flatMap((command) => [command, ...command.commands])]) {
    one.exitOverride();
    one.configureOutput({ writeOut: context.write, writeErr: () => {}, getOutHelpWidth: () => 100 });
  }
  try {
    await program.parseAsync([...words], { from: 'user' });
  } catch (error) {
    if (!(error instanceof CommanderError)) throw error;
    if (error.exitCode === 0) return 0;
    throw usage(error, program);
  }
  return status;
}

type Run = <Given extends unknown[]>(
  action: (context: Context, ...given: Given) => Promise<ExitStatus>,
) => (...given: Given) => Promise<void>;

function describe(run: Run): Command {
  const program = new Command('stoplog')
    .description(
      'Holds back a commit or pull request until the records of a catchment model are complete and still true.',
    )
    .version(version, '--version')
    .helpOption('--help', 'say how to use this')
    .helpCommand(false)
    .addHelpText(
      'after',
      `\nExit status: 0 pass, 1 blocked, 2 could not check.\n\n${wrap(caution, 100).join('\n')}`,
    );
  program
    .command('check')
    .description('check the records against the files: the main job')
    .option('--at <content>', '`worktree`, `index` (what is staged), or a revision', 'worktree')
    .option(
      '--base <revision>',
      'only what is new since this content left that revision blocks; the rest is listed',
    )
    .option('--strict', 'what the base had already blocks too')
    .option(
      '--if-touched',
      'pass at once where there is no manifest, or nothing that one governs differs from the base',
    )
    .option('--only <what>', 'one record, one area (such as `inputs`), or one manifest’s folder')
    .addOption(new Option('--phase <phase>', 'judge as if the study had come this far').choices(phases))
    .option('--report <kind=path>', `${kinds.join(', ')}; to a file or to \`-\`; may be repeated`, collect)
    .option(
      '--part <part>',
      'do one part of the work, such as `2of8`, and leave it for `--gather`; gives no verdict',
    )
    .option('--gather', 'check with what the parts left: the same verdict and reports as one run of its own')
    .option('--no-cache', 'read every file anew instead of remembering digests')
    .option('--quiet', 'print only what blocks')
    .option('--brief', 'print only what blocks, a line for each record that warns, and the tally (in hooks)')
    .option('--color', 'colour the text report also where the output is no terminal')
    .option('--no-color', 'never colour it')
    .action(run(checkCommand));

  program
    .command('seal')
    .description('after review, fingerprint records and what they rest on')
    .argument('[records...]', 'such as `inputs.rainfall`')
    .option('--all', 'every record that needs it')
    .option('--figures', 'first write the recomputed figures into the manifest; old and new are shown')
    .option('--because <reason>', 'why a record is sealed though its outputs did not change with its inputs')
    .option('--moved', 'follow files and records that were renamed, keeping who sealed them and when')
    .option('--only <folder>', 'one manifest’s folder')
    .action(run(sealCommand));

  program
    .command('dossier')
    .description('the provenance summary and the package for an archive, or the check of one')
    .option('--at <revision>', 'of which commit', 'HEAD')
    .option('--only <folder>', 'one manifest’s folder')
    .option('--out <path>', 'a new folder, `.zip` or `.tar.gz`; nothing is written over')
    .option('--bag', 'as a BagIt 1.0 bag, with the study’s files')
    .option('--draft', 'also where the check blocks; every page then says so')
    .option('--verify <path>', 'check a dossier or bag: a folder, `.zip` or `.tar.gz`')
    .action(
      run(async (context, options: DossierOptions) => {
        // Charts and archives are not loaded in a hook.
        const { dossierCommand } = await import('./dossier.ts');
        return dossierCommand(context, options);
      }),
    );

  program
    .command('rules')
    .description('list every rule, or explain one: when it fires, why, its source, how to clear it')
    .argument('[id]', 'such as `seal.stale`')
    .action(run(rulesCommand));

  program
    .command('pipeline')
    .description('print a job file for a CI host, ready to commit')
    .addArgument(new Argument('<host>', 'which host').choices(hosts))
    .option('--parts <number>', 'share the work on a large repository among so many machines', '1')
    .action(run(pipelineCommand));

  const hook = program
    .command('hook')
    .description('git hooks that check what is about to be committed or pushed');
  hook
    .command('add')
    .description('install them; hooks that are there are kept and run first')
    .addOption(
      new Option('--for <hook>', 'one of them only; `pre-receive` for a bare repository on a server').choices(
        hookNames,
      ),
    )
    .option(
      '--base <revision>',
      'hold back only what is new since this revision, such as `origin/main`: for a repository with a past',
    )
    .action(run(hookAdd));
  hook
    .command('remove')
    .description('take them out; what was there before is put back')
    .action(run(hookRemove));
  hook.command('list').description('say which hooks are there').action(run(hookList));
  return program;
}

function collect(value: string, before: readonly string[] = []): readonly string[] {
  return [...before, value];
}

function usage(error: CommanderError, program: Command): Failure {
  const known = program.commands.map((command) => command.name()).join(', ');
  const said = error.message.replace(/^(?:error: )?./, (start) => start.slice(-1).toUpperCase());
  return new Failure(
    'usage',
    error.code === 'commander.help' ? 'No command was given.' : `${said}.`.replace(/\.\.$/, '.'),
    `Commands: ${known}. \`stoplog --help\` or \`stoplog COMMAND --help\` says more.`,
    error,
  );
}
