import { z } from "zod";
import type { OwnedEntity } from "../database/owned.entity";
import type { Answer, Api, NamedSchema } from "./api";
import { currentUserId } from "./currentUser";
import { HttpProblem, notFound } from "./httpProblem";
import type { OwnedCollection } from "./ownedCollection.service";
import { parse } from "./parse";

interface CollectionContract<Item, Wishes> extends NamedSchema {
  schema: z.ZodType<Item>;
  /** the collection's name in addresses */
  plural: string;
  /** one item, in words */
  noun: string;
  /** what goes with an item when it is removed */
  removes?: string;
  /** what may be asked for when an item is saved, besides the item itself */
  wishes?: z.ZodObject & z.ZodType<Wishes>;
  /** answers to a save that only this collection gives */
  refusals?: Readonly<Record<number, Answer>>;
}

/** The id in an address; what is no id leads nowhere. */
export function idIn(params: Record<string, string>, name: string, noun: string): string {
  const id = z.uuid().safeParse(params[name]);
  if (!id.success) throw notFound(noun);
  return id.data.toLowerCase();
}

/** The five routes that every collection of one's own has. */
export function ownedCollectionRoutes<Item extends { id: string }, Row extends Item & OwnedEntity, Wishes = object>(
  api: Api,
  contract: CollectionContract<Item, Wishes>,
  items: OwnedCollection<Item, Row, Wishes>,
): void {
  const { plural, noun, removes, wishes, refusals } = contract;
  const common = { tag: plural, signedIn: true } as const;
  const one = `/${plural}/:id`;
  const missing = { description: `There is no such ${noun} in this account.` };
  const full = { description: `This account holds as many ${plural} as it may (collection-full).` };
  const idOf = (params: Record<string, string>) => idIn(params, "id", noun);

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
      ...(wishes ? { query: wishes } : {}),
      answers: {
        200: { description: "Replaced.", schema: contract },
        201: { description: "Created.", schema: contract },
        404: missing,
        409: full,
        ...refusals,
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
      const asked = wishes ? parse(wishes, req.query, "This cannot be asked for.") : ({} as Wishes);
      const saved = await items.put(currentUserId(res), { ...item, id }, asked);
      res.status(saved.created ? 201 : 200).json(saved.item);
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
