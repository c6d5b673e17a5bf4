import { ApiError } from "./apiError";
import { http } from "./httpClient";
import type { Items, Shelf } from "./items";

/** The signed-in person's shelf, kept by the server. */
export const serverShelf: Shelf = {
  list: (name) => http.get(`/${name}`),
  get: (name, id) => http.get(`/${name}/${encodeURIComponent(id)}`),
  put: (name, item, { version = false } = {}) =>
    http.put<Items[typeof name]>(`/${name}/${encodeURIComponent(item.id)}${version ? "?version=1" : ""}`, item),
  async remove(name, id) {
    try {
      await http.delete(`/${name}/${encodeURIComponent(id)}`);
    } catch (error) {
      if (!(error instanceof ApiError && error.status === 404)) throw error;
    }
  },
};
