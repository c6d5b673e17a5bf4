import type { DataSource } from "typeorm";
import type { OwnInstrument } from "../../shared/contract/instrument";
import { OwnedCollection } from "../http/ownedCollection.service";
import { InstrumentEntity } from "./instrument.entity";

export function instrumentsOf(dataSource: DataSource) {
  return new OwnedCollection<OwnInstrument, InstrumentEntity>(dataSource, InstrumentEntity, { noun: "instrument" });
}
