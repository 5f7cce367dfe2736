import type { Orm } from "@/db/database";
import { findActivePerson } from "@/modules/identity";
import { getParameter } from "@/modules/methods";
import type { FacilityParameter } from "@/modules/methods/model";
import { approvedVersions } from "./limits";
import type { LimitVersion } from "./model";
import { getPoint, type PointPlace } from "./points";

/**
 * What many readings of one slice have in common, looked up once. Lives as long as one transaction and no longer: nothing
 * in it can have changed in between.
 */
export class IntakeCache {
  readonly #places = new Map<number, PointPlace>();
  readonly #parameters = new Map<number, FacilityParameter>();
  readonly #versions = new Map<string, LimitVersion[]>();
  readonly #people = new Map<number, boolean>();

  constructor(private readonly db: Orm) {}

  /** @throws Problem `not-found` */
  place(pointId: number): PointPlace {
    return kept(this.#places, pointId, () => getPoint(this.db, pointId));
  }

  /** @throws Problem `not-found` */
  parameter(parameterId: number): FacilityParameter {
    return kept(this.#parameters, parameterId, () => getParameter(this.db, parameterId));
  }

  /** The approved versions of the limits of a point and parameter, oldest first. */
  versions(pointId: number, parameterId: number): LimitVersion[] {
    return kept(this.#versions, `${pointId} ${parameterId}`, () =>
      approvedVersions(this.db, pointId, parameterId),
    );
  }

  isActivePerson(personId: number): boolean {
    return kept(this.#people, personId, () => findActivePerson(this.db, personId) !== null);
  }
}

function kept<K, V>(map: Map<K, V>, key: K, find: () => V): V {
  const known = map.get(key);
  if (known !== undefined) return known;
  const found = find();
  map.set(key, found);
  return found;
}
