import type { ChildProcessWithoutNullStreams } from 'node:child_process';
import type { FoundBlob } from './blobs.ts';
import { type Place, startFailure, startGit } from './git.ts';
import { gitFailure } from './git-failure.ts';

const lineFeed = 10;
const nothing = Buffer.alloc(0);

/**
 * One `git cat-file --batch`: ids go in, contents come out in the same order. Bytes wait in the pipe until
 * they are asked for, so a slow reader slows git and fills no memory. A reader made for a list of ids gets
 * larger chunks, many objects in one; a reader without one stays open for questions.
 */
export class ObjectReader {
  readonly #place: Place;
  readonly #child: ChildProcessWithoutNullStreams;
  readonly #output: AsyncIterator<Buffer>;
  readonly #ended: Promise<{ status: number; cause?: Error }>;
  #errors = '';
  #ahead: Buffer = nothing;
  /** Of the object in hand: content bytes not yet handed out. */
  #left = 0;
  /** Of the object in hand: the line feed after its content is still to come. */
  #open = false;

  constructor(place: Place, list?: readonly string[]) {
    this.#place = place;
    this.#child = startGit(place, ['cat-file', '--batch', ...(list === undefined ? [] : ['--buffer'])]);
    this.#output = this.#child.stdout[Symbol.asyncIterator]();
    this.#child.stderr.on('data', (chunk: Buffer) => {
      this.#errors += chunk.toString();
    });
    this.#child.stdin.on('error', () => {});
    this.#ended = new Promise((resolve) => {
      this.#child.on('error', (cause) => resolve({ status: -1, cause }));
      this.#child.on('close', (status) => resolve({ status: status ?? -1 }));
    });
    if (list !== undefined) this.#child.stdin.end(`${list.join('\n')}\n`);
  }

  /** Asks for one object by its full id. */
  ask(id: string): Promise<FoundBlob | null> {
    this.#child.stdin.write(`${id}\n`);
    return this.next(id);
  }

  /** The next object of the list; null if it is not there or is no blob. Skips what is unread of the one before. */
  async next(id: string): Promise<FoundBlob | null> {
    if (this.#open) for await (const _ of this.#chunks());
    const [name, type, size] = (await this.#line()).split(' ');
    if (name !== id) throw new Error(`git answered for object ${name} when asked for ${id}`);
    if (type === 'missing' || size === undefined) return null;
    this.#left = Number(size);
    this.#open = true;
    if (type !== 'blob') return null;
    return { bytes: this.#left, chunks: () => this.#chunks(), whole: () => this.#whole() };
  }

  async end(): Promise<void> {
    this.#child.kill();
    // Output that nobody reads would keep the child from closing.
    this.#child.stdout.destroy();
    await this.#ended;
  }

  async *#chunks(): AsyncGenerator<Buffer> {
    while (this.#left > 0) yield await this.#chunk();
    await this.#finish();
  }

  async #whole(): Promise<Uint8Array> {
    const whole = new Uint8Array(this.#left);
    for (let at = 0; this.#left > 0; ) {
      const chunk = await this.#chunk();
      whole.set(chunk, at);
      at += chunk.length;
    }
    await this.#finish();
    return whole;
  }

  async #chunk(): Promise<Buffer> {
    if (this.#ahead.length === 0) this.#ahead = await this.#more();
    const chunk = this.#ahead.subarray(0, this.#left);
    this.#ahead = this.#ahead.subarray(chunk.length);
    this.#left -= chunk.length;
    return chunk;
  }

  /** A line feed follows the content; anything else means that its size was not as stated. */
  async #finish(): Promise<void> {
    this.#open = false;
    const rest = await this.#line();
    if (rest !== '')
      throw new Error(`git sent more of an object than the size it stated: ${rest.slice(0, 40)}`);
  }

  async #line(): Promise<string> {
    let end = this.#ahead.indexOf(lineFeed);
    while (end === -1) {
      this.#ahead = Buffer.concat([this.#ahead, await this.#more()]);
      end = this.#ahead.indexOf(lineFeed);
    }
    const line = this.#ahead.toString('latin1', 0, end);
    this.#ahead = this.#ahead.subarray(end + 1);
    return line;
  }

  async #more(): Promise<Buffer> {
    const { value, done } = await this.#output.next();
    if (done !== true) return value;
    const { status, cause } = await this.#ended;
    throw cause === undefined
      ? gitFailure(['cat-file'], status, this.#errors)
      : startFailure(this.#place, cause);
  }
}
