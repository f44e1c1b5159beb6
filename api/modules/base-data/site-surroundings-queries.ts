import type { EntityManager } from '@mikro-orm/postgresql';
import type { Polygonal } from '../../../shared/geometry/geojson-schema.ts';
import type { MassingBlock } from '../../../shared/massing/massing-block.ts';
import type { ReceptorClass } from '../../../shared/rules/rule-schema.ts';
import type { EvidenceBlock, EvidenceReceptor } from '../../../shared/study/evidence-schema.ts';
import type { StudyReach } from '../studies/study-reach.ts';

/** A building stands on the site when more than this share of its footprint lies in the site's parcels. */
const shareOnSite = 0.5;
/** The applicant has declared a building when blocks cover more than this share of its footprint. */
const shareDeclared = 0.01;

/** The heights in the base data that decide how far shadows reach. */
export async function findExtremeHeights(
  em: EntityManager,
  site: Polygonal,
): Promise<{ contextTopM: number; siteTopM: number; lowestPlaneM: number }> {
  const [row] = await em.execute<{ contextTopM: number; siteTopM: number; lowestPlaneM: number }[]>(
    `select coalesce(max(top_m), 0) as "contextTopM",
       coalesce(max(top_m) filter (where ST_Intersects(geometry, ST_GeomFromGeoJSON(?))), 0) as "siteTopM",
       least(0, (select min(plane_m) from collector)) as "lowestPlaneM"
     from building`,
    [JSON.stringify(site)],
  );
  return row ?? { contextTopM: 0, siteTopM: 0, lowestPlaneM: 0 };
}

/**
 * The buildings within reach: those around as context, and those on the site that the applicant has
 * not declared as existing. In the order of their ids, so that the same base data gives the same file.
 */
export async function listBuildingBlocks(
  em: EntityManager,
  {
    site,
    declared,
    reach,
    idPrefix,
  }: {
    site: Polygonal;
    /** The massing's existing blocks. */
    declared: readonly MassingBlock[];
    reach: StudyReach;
    idPrefix: string;
  },
): Promise<EvidenceBlock[]> {
  const rows = await em.execute<
    { id: string; baseM: number; topM: number; isOnSite: boolean; geometry: Polygonal }[]
  >(
    `with site as (select ST_GeomFromGeoJSON(?) as geometry),
     declared as (
       select ST_UnaryUnion(ST_Collect(ST_MakeValid(ST_GeomFromGeoJSON(one)))) as geometry
       from jsonb_array_elements(?::jsonb) as one
     ),
     near as (
       select building.*, ST_Area(building.geometry) as footprint,
         case when ST_Intersects(building.geometry, site.geometry)
           then ST_Area(ST_Intersection(building.geometry, site.geometry)) else 0 end as on_site
       from building, site
       where ST_DWithin(building.geometry::geography, site.geometry::geography, ?)
     )
     select id, base_m as "baseM", top_m as "topM", on_site > footprint * ? as "isOnSite",
       ST_AsGeoJSON(near.geometry, 15)::json as geometry
     from near, declared
     where not (
       on_site > footprint * ? and declared.geometry is not null
       and ST_Area(ST_Intersection(near.geometry, declared.geometry)) > footprint * ?
     )
     order by id collate "C"`,
    [
      JSON.stringify(site),
      JSON.stringify(declared.map(({ geometry }) => geometry)),
      reach.contextM,
      shareOnSite,
      shareOnSite,
      shareDeclared,
    ],
  );
  return rows.map(({ id, baseM, topM, isOnSite, geometry }) => ({
    type: 'Feature',
    properties: {
      id: idPrefix + id,
      role: isOnSite ? 'existing' : 'context',
      base: baseM,
      top: topM,
    },
    geometry,
  }));
}

/**
 * What may be affected within reach: parcels, yards, open space, walks and collectors, each kind in the
 * order of its ids. What belongs to the site itself is left out.
 */
export async function listReceptors(
  em: EntityManager,
  site: Polygonal,
  siteParcels: readonly string[],
  { receptorsM }: StudyReach,
): Promise<EvidenceReceptor[]> {
  const rows = await em.execute<
    {
      id: string;
      class: ReceptorClass;
      label: string;
      plane: number;
      tilt: number | null;
      facing: number | null;
      geometry: Polygonal;
    }[]
  >(
    `with site as (select ST_GeomFromGeoJSON(?) as geometry),
     own as (select jsonb_array_elements_text(?::jsonb) as number),
     receptor as (
       select 1 as kind, number as id, 'parcel' as class, address as label, 0 as plane,
         null::float8 as tilt, null::float8 as facing, geometry
       from parcel where number not in (select number from own)
       union all
       select 2, id, 'yard', label, 0, null, null, geometry
       from yard where parcel not in (select number from own)
       union all
       select 3, id, class, name, 0, null, null, geometry from open_space
       union all
       select 4, id, 'collector', address, plane_m, tilt_deg, facing_deg, geometry from collector
     )
     select id, class, label, plane, tilt, facing, ST_AsGeoJSON(receptor.geometry, 15)::json as geometry
     from receptor, site
     where ST_DWithin(receptor.geometry::geography, site.geometry::geography, ?)
       and not (
         kind > 2 and ST_Intersects(receptor.geometry, site.geometry)
         and ST_Area(ST_Intersection(receptor.geometry, site.geometry)) > ST_Area(receptor.geometry) * ?
       )
     order by kind, id collate "C"`,
    [JSON.stringify(site), JSON.stringify(siteParcels), receptorsM, shareOnSite],
  );
  return rows.map(({ id, class: receptorClass, label, plane, tilt, facing, geometry }) => ({
    type: 'Feature',
    properties: {
      id,
      class: receptorClass,
      label,
      plane,
      ...(tilt === null ? {} : { tilt }),
      ...(facing === null ? {} : { facing }),
    },
    geometry,
  }));
}
