import { Type } from '@mikro-orm/core';
import type { Geometry } from 'geojson';

/** A PostGIS geometry on WGS 84, held in memory as GeoJSON (RFC 7946). */
export class GeometryType<Shape extends Geometry> extends Type<Shape, string> {
  override convertToDatabaseValue(value: Shape): string {
    return JSON.stringify(value);
  }

  override convertToJSValue(value: string | Shape): Shape {
    return typeof value === 'string' ? (JSON.parse(value) as Shape) : value;
  }

  override convertToDatabaseValueSQL(key: string): string {
    return `ST_GeomFromGeoJSON(${key})`;
  }

  /** 15 decimals keep every digit of a double. */
  override convertToJSValueSQL(key: string): string {
    return `ST_AsGeoJSON(${key}, 15)`;
  }

  override getColumnType(): string {
    return 'geometry(Geometry, 4326)';
  }

  override compareAsType(): string {
    return 'string';
  }
}
