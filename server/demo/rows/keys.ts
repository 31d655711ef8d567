import { v7 } from 'uuid';

/** A record's id whose order follows the moment it belongs to, so that the log reads in the order things happened. */
export function idAt(instant: string): string {
  return v7({ msecs: Date.parse(instant) });
}

/** Ids by key, one kind of record at a time; asking for an unknown key is a mistake of the story. */
export class Keys {
  readonly #ids = new Map<string, string>();

  make(kind: string, key: string, instant: string): string {
    const id = idAt(instant);
    this.#ids.set(`${kind}/${key}`, id);
    return id;
  }

  /** @throws RangeError when nothing of that kind has this key */
  of(kind: string, key: string): string {
    const id = this.#ids.get(`${kind}/${key}`);
    if (!id) throw new RangeError(`the story names the ${kind} "${key}", which it does not have`);
    return id;
  }
}

/** Rows of one table, in the order they are written. */
export interface TableRows { table: string; rows: Record<string, unknown>[] }
