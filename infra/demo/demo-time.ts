import { AsyncLocalStorage } from 'node:async_hooks';
import type { Model, ModelStatic, Sequelize } from 'sequelize';

const storage = new AsyncLocalStorage<Date>();
const hookName = 'demo-time';

/** Does something as if it were `at`: rows written meanwhile carry that moment as created and updated. */
export async function atMoment<T>(at: Date, work: () => Promise<T>): Promise<T> {
  return await storage.run(at, work);
}

/** While `work` runs, rows of this database are stamped with the moment they tell of instead of the wall clock. */
export async function withDemoTime<T>(sequelize: Sequelize, work: () => Promise<T>): Promise<T> {
  sequelize.addHook('beforeCreate', hookName, (instance) => stamp(instance as Model, true));
  sequelize.addHook('beforeUpdate', hookName, (instance) => stamp(instance as Model, false));
  sequelize.addHook('beforeBulkUpdate', hookName, (options) => {
    const at = storage.getStore();
    // typed as options of the statement, it carries the new values too
    const { attributes } = options as { attributes?: Record<string, unknown> };
    if (at && attributes && 'updatedAt' in attributes) attributes.updatedAt = at;
  });
  try {
    return await work();
  } finally {
    for (const hook of ['beforeCreate', 'beforeUpdate', 'beforeBulkUpdate'] as const)
      sequelize.removeHook(hook, hookName);
  }
}

function stamp(instance: Model, isNew: boolean): void {
  const at = storage.getStore();
  const attributes = (instance.constructor as ModelStatic<Model>).getAttributes();
  if (!at) return;
  if (isNew && 'createdAt' in attributes) instance.set('createdAt' as never, at as never, { raw: true });
  if ('updatedAt' in attributes) instance.set('updatedAt' as never, at as never, { raw: true });
}
