import { Column, Entity, PrimaryColumn } from "typeorm";
import type { Account } from "../../shared/contract/account";

@Entity("users")
export class UserEntity {
  @PrimaryColumn({ type: "uuid" })
  id!: string;

  /** as typed at sign-up; compared without regard to case */
  @Column({ type: "text" })
  email!: string;

  @Column({ type: "text", name: "password_hash" })
  passwordHash!: string;

  @Column({ type: "text" })
  role!: Account["role"];

  @Column({ type: "timestamptz", name: "created_at", default: () => "now()" })
  createdAt!: Date;

  /** when its owner showed that the address is theirs */
  @Column({ type: "timestamptz", name: "confirmed_at", nullable: true })
  confirmedAt!: Date | null;

  @Column({ type: "timestamptz", name: "suspended_at", nullable: true })
  suspendedAt!: Date | null;

  /** when it goes for good, if its owner does not come back before */
  @Column({ type: "timestamptz", name: "erase_at", nullable: true })
  eraseAt!: Date | null;

  @Column({ type: "smallint", name: "birth_year", nullable: true })
  birthYear!: number | null;

  @Column({ type: "text", nullable: true })
  country!: string | null;
}
