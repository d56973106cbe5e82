import type { Client, InArgs, InStatement, ResultSet, Transaction } from '@libsql/client';

import type { WriteQueue } from './write-queue';

/**
 * The same client, with every write, batch, migration and transaction passing one queue, and batches
 * and transactions always begun as writers: a deferred one may meet SQLITE_BUSY when it first writes.
 */
export function queuedClient(
  client: Client,
  queue: WriteQueue,
  onFailure: (error: unknown) => void,
): Client {
  const watched = async <T>(work: () => Promise<T>): Promise<T> => {
    try {
      return await work();
    } catch (error) {
      onFailure(error);
      throw error;
    }
  };

  function execute(statement: InStatement | string, args?: InArgs): Promise<ResultSet> {
    const work = () =>
      watched(() =>
        typeof statement === 'string' ? client.execute(statement, args) : client.execute(statement),
      );
    return onlyReads(statement) ? work() : queue.run(work);
  }

  async function transaction(): Promise<Transaction> {
    const leave = await queue.enter();
    try {
      return leavingTransaction(await watched(() => client.transaction('write')), leave, watched);
    } catch (error) {
      leave();
      throw error;
    }
  }

  return {
    execute,
    transaction,
    batch: (statements) => queue.run(() => watched(() => client.batch(statements, 'write'))),
    migrate: (statements) => queue.run(() => watched(() => client.migrate(statements))),
    executeMultiple: (sql) => queue.run(() => watched(() => client.executeMultiple(sql))),
    sync: () => queue.run(() => client.sync()),
    close: () => client.close(),
    reconnect: () => client.reconnect(),
    get closed() {
      return client.closed;
    },
    get protocol() {
      return client.protocol;
    },
  };
}

/** Hands the queue on when the transaction ends, whichever way it ends. */
function leavingTransaction(
  transaction: Transaction,
  leave: () => void,
  watched: <T>(work: () => Promise<T>) => Promise<T>,
): Transaction {
  return {
    execute: (statement: InStatement) => watched(() => transaction.execute(statement)),
    batch: (statements) => watched(() => transaction.batch(statements)),
    executeMultiple: (sql) => watched(() => transaction.executeMultiple(sql)),
    commit: () => watched(() => transaction.commit()).finally(leave),
    rollback: () => transaction.rollback().finally(leave),
    close: () => {
      transaction.close();
      leave();
    },
    get closed() {
      return transaction.closed;
    },
  };
}

function onlyReads(statement: InStatement | string): boolean {
  const sql = typeof statement === 'string' ? statement : statement.sql;
  return /^\s*\(?\s*select\b/i.test(sql);
}
