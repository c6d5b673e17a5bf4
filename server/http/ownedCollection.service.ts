import type { DataSource, EntityManager, QueryDeepPartialEntity } from "typeorm";
import type { OwnedEntity } from "../database/owned.entity";
import { HttpProblem, notFound } from "./httpProblem";

/** Enough for a life of songs, too few to fill a disk. */
const mostItems = 2000;

interface Options<Item> {
  /** one item, in words */
  noun: string;
  /** runs in the same transaction, before the item is written */
  beforeSave?: (manager: EntityManager, userId: string, item: Item) => Promise<void>;
  mostItems?: number;
}

/** Items that belong to one person. Another person's item is as if it did not exist. */
export class OwnedCollection<Item extends { id: string }, Row extends Item & OwnedEntity> {
  private readonly noun: string;
  private readonly limit: number;

  constructor(
    private readonly dataSource: DataSource,
    private readonly entity: new () => Row,
    private readonly options: Options<Item>,
  ) {
    this.noun = options.noun;
    this.limit = options.mostItems ?? mostItems;
  }

  async list(userId: string): Promise<Item[]> {
    const rows = await this.rowsOf(userId).orderBy("item.savedAt").addOrderBy("item.id").getMany();
    return rows.map((row) => this.toItem(row));
  }

  async get(userId: string, id: string): Promise<Item> {
    const row = await this.rowsOf(userId).andWhere("item.id = :id", { id }).getOne();
    if (!row) throw notFound(this.noun);
    return this.toItem(row);
  }

  /** Creates or replaces; the same request may be sent again. True if the item is new. */
  async put(userId: string, item: Item): Promise<boolean> {
    return this.dataSource.transaction(async (manager) => {
      // One writer per account at a time: ON CONFLICT guards only the primary key, not the other unique
      // index (id, user_id), and the count of items must not be overtaken.
      await manager.query("SELECT FROM users WHERE id = $1 FOR NO KEY UPDATE", [userId]);
      await this.options.beforeSave?.(manager, userId, item);
      const { columns, tableName } = this.dataSource.getMetadata(this.entity);
      const kept = new Set(["id", "user_id", "saved_at"]);
      const overwritten = columns.map((column) => column.databaseName).filter((name) => !kept.has(name));
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
      if (saved.created) await this.refuseTooMany(manager, userId);
      return saved.created;
    });
  }

  async remove(userId: string, id: string): Promise<void> {
    const { affected } = await this.dataSource
      .createQueryBuilder()
      .delete()
      .from(this.entity)
      .where("user_id = :userId AND id = :id", { userId, id })
      .execute();
    if (!affected) throw notFound(this.noun);
  }

  private async refuseTooMany(manager: EntityManager, userId: string): Promise<void> {
    const count = await manager
      .createQueryBuilder(this.entity, "item")
      .where("item.userId = :userId", { userId })
      .getCount();
    if (count > this.limit) {
      throw new HttpProblem(
        409,
        "collection-full",
        `An account keeps at most ${this.limit} of these. Remove one first.`,
      );
    }
  }

  private rowsOf(userId: string) {
    return this.dataSource.createQueryBuilder(this.entity, "item").where("item.userId = :userId", { userId });
  }

  private toItem({ userId: _userId, savedAt: _savedAt, ...item }: Row): Item {
    return item as unknown as Item;
  }
}
