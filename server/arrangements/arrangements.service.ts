import type { DataSource } from "typeorm";
import type { Arrangement } from "../../shared/contract/arrangement";
import { OwnedCollection } from "../http/ownedCollection.service";
import { ArrangementEntity } from "./arrangement.entity";

export function arrangementsOf(dataSource: DataSource) {
  return new OwnedCollection<Arrangement, ArrangementEntity>(dataSource, ArrangementEntity, { noun: "arrangement" });
}
