import type { Repository } from '../../repository/repository.ts';
import { formerHomes, type HookHome, hookHome, hooksFor } from './home.ts';
import { type HookState, lookAtHook } from './look.ts';

import { findTool, type Tool } from './tool.ts';

/**
 * `written` new; `renewed` ours, brought to this version's text or made executable again; `left` ours once, and
 * changed by someone since; `removed` leaves nothing; `restored` leaves what was there before; `none` no change.
 */
export type Done = 'written' | 'renewed' | 'left' | 'removed' | 'restored' | 'none';

export interface HookReport {
  readonly home: HookHome;
  /** Every hook in its home, then those of ours that lie where git does not look now. */
  readonly hooks: readonly (HookState & { readonly done: Done })[];
  readonly tool: Tool;
}

/** What is there now, and what was done to it, by file. Throws Failure 'unreadable-file'. */
export async function reportHooks(
  repository: Repository,
  home: HookHome,
  done: ReadonlyMap<string, Done>,
): Promise<HookReport> {
  const hooks: (HookState & { done: Done })[] = [];
  for (const one of [home, ...formerHomes(repository, home)]) {
    for (const hook of hooksFor(repository)) {
      const { content, mode, block, ...state } = await lookAtHook(one, hook);
      const did = done.get(state.file) ?? 'none';
      if (one === home || block !== null || did !== 'none') hooks.push({ ...state, done: did });
    }
  }
  return { home, hooks, tool: await findTool(repository) };
}

/** What is there. Failures: 'usage' (see `hookHome`), 'unreadable-file'. */
export async function listHooks(repository: Repository): Promise<HookReport> {
  return reportHooks(repository, await hookHome(repository), new Map());
}
