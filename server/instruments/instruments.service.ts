import type { DataSource } from "typeorm";
import type { OwnInstrument } from "../../shared/contract/instrument";
import { OwnedCollection } from "../http/ownedCollection.service";
import { InstrumentEntity } from "./instrument.entity";

/** A roomful, each with a photo of 90 KB. */
const mostItems = 200;

export function instrumentsOf(dataSource: DataSource) {
  return new OwnedCollection<OwnInstrument, InstrumentEntity>(dataSource, InstrumentEntity, {
    noun: "instrument",
    mostItems,
    // One is played first: a new favourite takes the place of the old one, also when it moves in from a device.
    async beforeSave({ manager, userId, item }) {
      if (item.favourite)
        await manager.query("UPDATE instruments SET favourite = false WHERE user_id = $1 AND id <> $2 AND favourite", [
          userId,
          item.id,
        ]);
      return item;
    },
  });
}
