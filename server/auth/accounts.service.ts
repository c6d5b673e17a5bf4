import type { DataSource } from "typeorm";
import type { Account } from "../../shared/contract/account";
import { HttpProblem, noSession } from "../http/httpProblem";
import { hashPassword, passwordMatches } from "./passwords";
import { UserEntity } from "./user.entity";

/** People and their passwords. */
export class AccountsService {
  constructor(private readonly dataSource: DataSource) {}

  async open(email: string, password: string, role: Account["role"] = "singer"): Promise<Account> {
    const passwordHash = await hashPassword(password);
    const rows: { id: string }[] = await this.dataSource.query(
      `INSERT INTO users (email, password_hash, role) VALUES ($1, $2, $3)
       ON CONFLICT (lower(email)) DO NOTHING RETURNING id`,
      [email, passwordHash, role],
    );
    const [user] = rows;
    if (!user)
      throw new HttpProblem(409, "email-taken", "There is an account with this e-mail address. Sign in instead.");
    return { id: user.id, email, role };
  }

  /** Null if the address or the password is wrong; which of them is nobody's business. */
  async recognise(email: string, password: string): Promise<Account | null> {
    const user = await this.users().where("lower(user.email) = lower(:email)", { email }).getOne();
    const matches = await passwordMatches(user?.passwordHash ?? null, password);
    return user && matches ? toAccount(user) : null;
  }

  async get(id: string): Promise<Account> {
    const user = await this.users().where("user.id = :id", { id }).getOne();
    if (!user) throw noSession("This account no longer exists.");
    return toAccount(user);
  }

  private users() {
    return this.dataSource.createQueryBuilder(UserEntity, "user");
  }
}

function toAccount({ id, email, role }: UserEntity): Account {
  return { id, email, role };
}
