import { Column, Entity } from "typeorm";
import type { SheetLink } from "../../shared/contract/sheetLink";
import { isoInstant, isoInstantOrNull, OwnedEntity } from "../database/owned.entity";

@Entity("sheet_links")
export class SheetLinkEntity extends OwnedEntity implements SheetLink {
  @Column({ type: "uuid", name: "song_id" })
  songId!: string;

  @Column({ type: "text" })
  label!: string;

  /** SHA-256 of the secret part of the address */
  @Column({ type: "bytea", name: "token_hash", select: false })
  tokenHash!: Buffer;

  @Column({ type: "jsonb" })
  view!: SheetLink["view"];

  @Column({ type: "timestamptz", name: "created_at", transformer: isoInstant })
  createdAt!: string;

  @Column({ type: "timestamptz", name: "expires_at", transformer: isoInstant })
  expiresAt!: string;

  @Column({ type: "timestamptz", name: "revoked_at", nullable: true, transformer: isoInstantOrNull })
  revokedAt!: string | null;

  @Column({ type: "timestamptz", name: "opened_at", nullable: true, transformer: isoInstantOrNull })
  openedAt!: string | null;
}
