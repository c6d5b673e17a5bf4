import type { DataSource, EntityManager, QueryDeepPartialEntity } from "typeorm";
import type { OwnedEntity } from "../database/owned.entity";
import { HttpProblem, notFound } from "./httpProblem";

/** Enough for a life, too few to fill a disk. */
const mostItems = 2000;
/** A song can be large. */
const atOnce = 25;

/** An item on its way in, in a transaction in which nobody else writes to this account. */
export interface Saving<Item, Wishes> {
  manager: EntityManager;
  userId: string;
  item: Item;
  /** what this account holds under the same id */
  kept: Item | null;
  /** what the address asked for besides */
  wishes: Wishes;
}

interface Options<Item, Wishes> {
  /** one item, in words */
  noun: string;
  /** Runs before the item is written and gives what to write; null leaves what is kept as it is. */
  beforeSave?: (saving: Saving<Item, Wishes>) => Promise<Item | null>;
  /** Runs before an item is removed, in the same transaction. */
  beforeRemove?: (manager: EntityManager, userId: string, id: string) => Promise<void>;
  mostItems?: number;
}

/** Items that belong to one person. Another person's item is as if it did not exist. */
export class OwnedCollection<Item extends { id: string }, Row extends Item & OwnedEntity, Wishes = object> {
  private readonly noun: string;
  private readonly limit: number;

  constructor(
    private readonly dataSource: DataSource,
    private readonly entity: new () => Row,
    private readonly options: Options<Item, Wishes>,
  ) {
    this.noun = options.noun;
    this.limit = options.mostItems ?? mostItems;
  }

  async list(userId: string): Promise<Item[]> {
    const rows = await rowsOf(this.dataSource.manager, this.entity, userId)
      .orderBy("item.savedAt")
      .addOrderBy("item.id")
      .getMany();
    return rows.map((row) => toItem<Item, Row>(row));
  }

  async get(userId: string, id: string): Promise<Item> {
    const item = await this.find(this.dataSource.manager, userId, id);
    if (!item) throw notFound(this.noun);
    return item;
  }

  /** Creates or replaces; the same request may be sent again. */
  async put(userId: string, item: Item, wishes: Wishes): Promise<{ created: boolean; item: Item }> {
    return this.dataSource.transaction((manager) => this.putIn(manager, userId, item, wishes));
  }

  /** The same within a transaction that does more. */
  async putIn(
    manager: EntityManager,
    userId: string,
    item: Item,
    wishes: Wishes,
  ): Promise<{ created: boolean; item: Item }> {
    await lockAccounts(manager, [userId]);
    const { id } = item;
    const kept = await this.find(manager, userId, id);
    const { beforeSave } = this.options;
    const next = beforeSave ? await beforeSave({ manager, userId, item, kept, wishes }) : item;
    if (next === null && kept) return { created: false, item: kept };
    const created = await this.write(manager, userId, next ?? item);
    if (created) await this.refuseTooMany(manager, [userId]);
    const saved = await this.find(manager, userId, id);
    if (!saved) throw notFound(this.noun);
    return { created, item: saved };
  }

  /** New items for many people within a transaction that does more, all of them or none; few questions to the database. */
  async addAll(
    manager: EntityManager,
    entries: readonly { userId: string; item: Item }[],
    wishes: Wishes,
  ): Promise<void> {
    const people = entries.map(({ userId }) => userId);
    await lockAccounts(manager, people);
    const { beforeSave } = this.options;
    for (let k = 0; k < entries.length; k += atOnce) {
      const rows: QueryDeepPartialEntity<Row>[] = [];
      for (const { userId, item } of entries.slice(k, k + atOnce)) {
        const next = beforeSave ? await beforeSave({ manager, userId, item, kept: null, wishes }) : item;
        rows.push({ ...(next ?? item), userId } as unknown as QueryDeepPartialEntity<Row>);
      }
      await manager.createQueryBuilder().insert().into(this.entity).values(rows).updateEntity(false).execute();
    }
    await this.refuseTooMany(manager, people);
  }

  async remove(userId: string, id: string): Promise<void> {
    await this.dataSource.transaction(async (manager) => {
      await lockAccounts(manager, [userId]);
      await this.options.beforeRemove?.(manager, userId, id);
      const { affected } = await manager
        .createQueryBuilder()
        .delete()
        .from(this.entity)
        .where("user_id = :userId AND id = :id", { userId, id })
        .execute();
      if (!affected) throw notFound(this.noun);
    });
  }

  /** True if the item is new. */
  private async write(manager: EntityManager, userId: string, item: Item): Promise<boolean> {
    const { columns, tableName } = this.dataSource.getMetadata(this.entity);
    const kept = new Set(["id", "user_id", "saved_at"]);
    const overwritten = columns
      .filter(({ databaseName, isUpdate }) => isUpdate && !kept.has(databaseName))
      .map(({ databaseName }) => databaseName);
    const result = await manager
      .createQueryBuilder()
      .insert()
      .into(this.entity)
      .values({ ...item, userId } as unknown as QueryDeepPartialEntity<Row>)
      .orUpdate(overwritten, ["id"], {
        overwriteCondition: { where: `"${tableName}"."user_id" = excluded."user_id"` },
      })
      .returning("(xmax = 0) AS created")
      .updateEntity(false)
      .execute();
    const [saved] = result.raw as { created: boolean }[];
    if (!saved) throw notFound(this.noun);
    return saved.created;
  }

  private async find(manager: EntityManager, userId: string, id: string): Promise<Item | null> {
    const row = await rowsOf(manager, this.entity, userId).andWhere("item.id = :id", { id }).getOne();
    return row && toItem<Item, Row>(row);
  }

  private async refuseTooMany(manager: EntityManager, people: readonly string[]): Promise<void> {
    const full: object[] = await manager
      .createQueryBuilder(this.entity, "item")
      .select("item.userId")
      .where("item.userId IN (:...people)", { people })
      .groupBy("item.userId")
      .having("count(*) > :limit", { limit: this.limit })
      .getRawMany();
    if (full.length === 0) return;
    const message = `An account keeps at most ${this.limit} of these. Remove one first.`;
    throw new HttpProblem(409, "collection-full", message);
  }
}

/**
 * One writer per account at a time, who locks the account before anything else: ON CONFLICT guards only the primary key,
 * not the other unique index (id, user_id); the count of items must not be overtaken; and whoever removes a song and
 * whoever decides its key would lock the two rows in opposite order.
 */
export async function lockAccounts(manager: EntityManager, people: readonly string[]): Promise<void> {
  await manager.query("SELECT FROM users WHERE id = ANY($1) ORDER BY id FOR NO KEY UPDATE", [people]);
}

function rowsOf<Row extends OwnedEntity>(manager: EntityManager, entity: new () => Row, userId: string) {
  return manager.createQueryBuilder(entity, "item").where("item.userId = :userId", { userId });
}

function toItem<Item, Row extends Item & OwnedEntity>({ userId: _userId, savedAt: _savedAt, ...item }: Row): Item {
  return item as unknown as Item;
}
