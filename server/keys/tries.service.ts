import type { DataSource } from "typeorm";
import type { Try } from "../../shared/contract/try";
import { OwnedCollection } from "../http/ownedCollection.service";
import { TryEntity } from "./try.entity";

export function triesOf(dataSource: DataSource) {
  return new OwnedCollection<Try, TryEntity>(dataSource, TryEntity, { noun: "try" });
}
