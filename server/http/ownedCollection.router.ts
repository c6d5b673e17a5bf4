import { z } from "zod";
import type { OwnedEntity } from "../database/owned.entity";
import type { Api, NamedSchema } from "./api";
import { currentUserId } from "./currentUser";
import { HttpProblem, notFound } from "./httpProblem";
import type { OwnedCollection } from "./ownedCollection.service";
import { parse } from "./parse";

interface CollectionContract<Item> extends NamedSchema {
  schema: z.ZodType<Item>;
  /** the collection's name in addresses */
  plural: string;
  /** one item, in words */
  noun: string;
  /** what goes with an item when it is removed */
  removes?: string;
}

/** The five routes that every collection of one's own has. */
export function ownedCollectionRoutes<Item extends { id: string }, Row extends Item & OwnedEntity>(
  api: Api,
  contract: CollectionContract<Item>,
  items: OwnedCollection<Item, Row>,
): void {
  const { plural, noun, removes } = contract;
  const common = { tag: plural, signedIn: true } as const;
  const one = `/${plural}/:id`;
  const missing = { description: `There is no such ${noun} in this account.` };
  const idOf = (params: Record<string, string>) => {
    const id = z.uuid().safeParse(params.id);
    if (!id.success) throw notFound(noun);
    return id.data.toLowerCase();
  };

  api.route(
    {
      ...common,
      method: "get",
      path: `/${plural}`,
      summary: `All ${plural} of this account, oldest first`,
      answers: { 200: { description: `The ${plural}.`, schema: contract, list: true } },
    },
    async (_req, res) => {
      res.json(await items.list(currentUserId(res)));
    },
  );
  api.route(
    {
      ...common,
      method: "get",
      path: one,
      summary: `One ${noun}`,
      answers: { 200: { description: `The ${noun}.`, schema: contract }, 404: missing },
    },
    async (req, res) => {
      res.json(await items.get(currentUserId(res), idOf(req.params)));
    },
  );
  api.route(
    {
      ...common,
      method: "put",
      path: one,
      summary: `Save the ${noun} under an id of your making; may be repeated`,
      body: contract,
      answers: {
        200: { description: "Replaced.", schema: contract },
        201: { description: "Created.", schema: contract },
        404: missing,
      },
    },
    async (req, res) => {
      const id = idOf(req.params);
      const item = parse(contract.schema, req.body);
      if (item.id.toLowerCase() !== id) {
        throw new HttpProblem(422, "invalid", "The id in the address and the id inside differ.", [
          { path: "id", message: "Must be the id in the address." },
        ]);
      }
      const userId = currentUserId(res);
      const created = await items.put(userId, { ...item, id });
      res.status(created ? 201 : 200).json(await items.get(userId, id));
    },
  );
  api.route(
    {
      ...common,
      method: "delete",
      path: one,
      summary: `Remove the ${noun}${removes ? ` and ${removes}` : ""}`,
      answers: { 204: { description: "Removed." }, 404: missing },
    },
    async (req, res) => {
      await items.remove(currentUserId(res), idOf(req.params));
      res.status(204).end();
    },
  );
}
