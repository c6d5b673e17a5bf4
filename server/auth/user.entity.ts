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
}
