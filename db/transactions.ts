import { AsyncLocalStorage, AsyncResource } from 'node:async_hooks';
import { Sequelize, Transaction } from 'sequelize';

type Held = Map<string, unknown>;

/**
 * Sequelize asks this for the transaction of the calling chain of promises, so that a query made
 * inside `write` joins it without being told. One for the process: Sequelize keeps it in a static.
 */
class Namespace {
  #storage = new AsyncLocalStorage<Held>();

  run(fn: (held: Held) => void): void {
    const held: Held = new Map();
    this.#storage.run(held, () => fn(held));
  }

  bind<F extends (...args: never[]) => unknown>(fn: F): F {
    return AsyncResource.bind(fn as never) as unknown as F;
  }

  get(key: string): unknown {
    return this.#storage.getStore()?.get(key);
  }

  set(key: string, value: unknown): void {
    this.#storage.getStore()?.set(key, value);
  }
}

// A development server may load this module again while an open database still uses the first namespace.
const held = globalThis as { matchmarkTransactions?: Namespace };
const namespace = (held.matchmarkTransactions ??= new Namespace());
Sequelize.useCLS(namespace);

/** The transaction that the calling chain of promises is in, if it belongs to `sequelize`. */
export function currentTransaction(sequelize: Sequelize): Transaction | null {
  const found = namespace.get('transaction');
  return found instanceof Transaction && (found as { sequelize?: Sequelize }).sequelize === sequelize ? found : null;
}
