import type { DataSource } from "typeorm";
import { ownInstrument } from "../../shared/contract/instrument";
import type { Api } from "../http/api";
import { ownedCollectionRoutes } from "../http/ownedCollection.router";
import { instrumentsOf } from "./instruments.service";

export function instrumentsRoutes(api: Api, dataSource: DataSource): void {
  const instruments = { name: "OwnInstrument", schema: ownInstrument, plural: "instruments", noun: "instrument" };
  ownedCollectionRoutes(api, instruments, instrumentsOf(dataSource));
}
