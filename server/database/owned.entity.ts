import { Column, PrimaryColumn, type ValueTransformer } from "typeorm";

/** What every row has that belongs to one person. The table's other columns are named as the fields of its contract. */
export abstract class OwnedEntity {
  @PrimaryColumn({ type: "uuid" })
  id!: string;

  @Column({ type: "uuid", name: "user_id" })
  userId!: string;

  /** when it first reached the server; orders lists */
  @Column({ type: "timestamptz", name: "saved_at", default: () => "now()" })
  savedAt!: Date;
}

/** Instants travel as ISO strings and are stored as instants. */
export const isoInstant: ValueTransformer = {
  to: (value: string) => value,
  from: (value: Date) => value.toISOString(),
};

export const isoInstantOrNull: ValueTransformer = {
  to: (value: string | null) => value,
  from: (value: Date | null) => value?.toISOString() ?? null,
};

/** For fields that may be missing from the contract: NULL in the table. */
export const absentAsNull: ValueTransformer = {
  to: (value: unknown) => value ?? null,
  from: (value: unknown) => value ?? undefined,
};
