import type { FindOptions, Model, ModelStatic } from 'sequelize';
import { currentScope } from './scope.ts';

type Owned = Model & { businessId: string };

/**
 * Adds the tenancy hooks to a model: finds, counts, bulk updates and deletes get the business in
 * their where-clause, new rows get its id, and anything outside `inBusiness` throws. Includes
 * escape such hooks, which is why models have no associations and foreign keys are composite.
 */
export function scopeModel<M extends Model>(model: ModelStatic<M>): void {
  const name = model.name;
  const narrow = (options: FindOptions) => {
    const scope = needScope(name);
    if (scope === 'across') return;
    options.where = { ...(options.where as object | undefined), businessId: scope } as never;
  };
  const own = (row: Model) => {
    const scope = needScope(name);
    if (scope === 'across') return;
    const owned = row as Owned;
    if (owned.businessId == null) owned.businessId = scope;
    if (owned.businessId !== scope) throw new Error(`${name}: row of another business`);
  };
  model.addHook('beforeFind', narrow);
  model.addHook('beforeCount', narrow);
  model.addHook('beforeBulkUpdate', narrow as never);
  model.addHook('beforeBulkDestroy', narrow as never);
  model.addHook('beforeValidate', own);
  model.addHook('beforeSave', own);
  model.addHook('beforeDestroy', own);
  model.addHook('beforeBulkCreate', (rows: Model[]) => rows.forEach(own));
  for (const method of unhooked)
    Object.defineProperty(model, method, {
      value: () => {
        throw new Error(`${name}.${method} would escape the business: find and save rows instead`);
      },
    });
}

/** Sequelize runs no hook of ours before these. */
const unhooked = ['increment', 'decrement', 'upsert', 'max', 'min', 'sum', 'truncate'];

function needScope(name: string): string {
  const scope = currentScope();
  if (scope === null) throw new Error(`${name} was touched outside inBusiness`);
  return scope;
}
