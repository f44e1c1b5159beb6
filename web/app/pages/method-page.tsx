import { Link } from 'react-router-dom';
import { PageHeading } from '../../components/page-heading.tsx';
import { usePlace } from '../../lib/place-context.ts';
import { paths } from '../paths.ts';
import { MethodSection } from './method-section.tsx';
import { SunOfPlace } from './sun-of-place.tsx';

/** How sun and shadows are computed, what is left out, and where the methods come from. */
export function MethodPage() {
  const { municipality, formats } = usePlace();
  return (
    <article className="sheet-width grid gap-8 py-8">
      <div className="grid gap-3">
        <PageHeading>How the sun and the shadows are computed</PageHeading>
        <p className="measure text-lead">
          Every figure here comes from geometry: where the sun stands, what stands in its way, and
          how much of a place it reaches. Anybody can recompute a study from its evidence file.
        </p>
      </div>

      <MethodSection title="Where the sun stands">
        <p>
          The sun’s place in the sky is computed for {municipality.shortName} (
          {formats.number(Math.abs(municipality.latitude), 2)}°{' '}
          {municipality.latitude >= 0 ? 'north' : 'south'},{' '}
          {formats.number(Math.abs(municipality.longitude), 2)}°{' '}
          {municipality.longitude >= 0 ? 'east' : 'west'}) and for the instant. Its direction is
          counted clockwise from true north. Its height above the horizon is the one that an eye
          sees: with the bending of light in air of 1010 hPa and 10 °C, the same everywhere.
        </p>
        <p>
          The formulas are those of the open library suncalc, because they are fast enough to follow
          a hand on the screen. Held against a second library, astronomy-engine, at thousands of
          instants from 1990 to 2060 and up to 65° of latitude, the height is off by 0.003° in the
          mean and 0.014° at most, the direction by no more. A hundredth of a degree moves the tip
          of a 10 m pole’s shadow by 6 cm when the sun is 10° high.
        </p>
        <SunOfPlace />
        <p>
          In this table the sun rises and sets as in an almanac: with the upper edge of its disc. A
          study counts from the moment when the middle of the disc stands on a level horizon, a
          minute or two later at middle latitudes, until it stands there again.
        </p>
        <p>
          Key dates are the civil days on which the equinoxes and solstices of the year fall. Times
          are shown on the municipality’s clock, with the name of its zone. A rule may judge by
          another clock, such as standard time all year; then the hours are converted.
        </p>
      </MethodSection>

      <MethodSection title="What casts shadows">
        <p>
          Buildings are solid blocks with vertical walls, a base and a top. Those around the site
          come from the municipality’s building data, those on the site from the applicant’s
          massing. Lengths are taken on a flat plane around the place, on which a metre is a metre;
          north is true north.
        </p>
        <p>
          The shadow of a block on level ground is found exactly, not by sampling: every edge that
          the sun sees from behind is carried along the ground as far as its height casts it. “Now”
          is what stands around and what stands on the site today. “With the proposal” is what
          stands around and the proposed blocks. Net new shadow is shaded only with the proposal.
        </p>
      </MethodSection>

      <MethodSection title="What is counted at a place">
        <p>
          A place is a parcel, a yard, an open space, a walk or a solar collector. Its open area is
          what no surrounding building stands on. At each instant the part of that area in sun is
          measured, now and with the proposal. Added up over a day this gives mean hours of sun,
          square metre hours, and the energy of direct sunlight under a clear sky.
        </p>
        <p>
          Hours alone can mislead: low winter sun is spread over more ground and comes through more
          air, so an hour of it carries a fraction of a summer hour’s energy. That is why all three
          stand side by side. From–to times are those in which at least a twentieth of the open area
          loses the sun.
        </p>
        <p>
          The areas are computed in two ways that share nothing but the blocks: by adding up narrow
          strips of each place, and from the outlines that are drawn on the map. Every study records
          the largest difference between the two; it is well below a hundredth of a square metre.
        </p>
      </MethodSection>

      <MethodSection title="How the rule is applied">
        <p>
          The municipality’s rule says which places are judged, on which days, in which hours, and
          what they must keep. A study keeps the version of the rule by which it was judged. Every
          place that does not meet it is listed by address on the first page of the staff report.
        </p>
        <p>
          <Link to={paths.adminRules.href()} className="link">
            The rule and its versions in plain words
          </Link>
        </p>
        <p>
          The loss index, from 0 to 100, is the share of clear-sky solar energy lost at the places
          that lose any, in the hours that the rule judges.
        </p>
      </MethodSection>

      <MethodSection title="What is left out">
        <ul className="grid list-disc gap-1.5 ps-5">
          <li>
            Ground is treated as level. On falling ground shadows are longer, on rising ground
            shorter: a slope of five in a hundred can more than double a winter shadow’s area.
          </li>
          <li>Trees, fences and other small things cast no shadow here.</li>
          <li>
            Roofs are flat at the top height given. The heights of existing buildings are as good as
            the municipality’s data.
          </li>
          <li>
            The sun is a point. In truth it is half a degree wide, and a shadow’s edge is blurred:
            by about 1.6 m for an edge 20 m up when the sun is 20° high.
          </li>
          <li>Clouds, haze and reflected light are left out; energy is for a clear sky.</li>
        </ul>
        <p>
          A study is a planning-level study on the massing as submitted. It is no survey and no
          legal opinion: the local code and licensed professionals decide.
        </p>
      </MethodSection>

      <MethodSection title="Recomputing a study">
        <p>
          Each finished study can be downloaded as one evidence file: its inputs, the rule, the
          results, and a digest (SHA-256) over all of it. The same program, run on that file without
          an account or a database, arrives at the same digest; if one figure were changed, it would
          not.
        </p>
      </MethodSection>

      <MethodSection title="Sources">
        <ul className="grid list-disc gap-1.5 ps-5">
          <li>
            Sun position, refraction: J. Meeus, <cite>Astronomical Algorithms</cite>, 2nd edition,
            1998, by the open library suncalc. Equinoxes, solstices, sunrise and solar time: the
            open library astronomy-engine.
          </li>
          <li>
            Direct sunlight under a clear sky: P. Ineichen and R. Perez, “A new airmass independent
            formulation for the Linke turbidity coefficient”, <cite>Solar Energy</cite> 73, 2002.
          </li>
          <li>
            Air mass: F. Kasten and A. T. Young, “Revised optical air mass tables and approximation
            formula”, <cite>Applied Optics</cite> 28, 1989.
          </li>
          <li>Map plane: transverse Mercator projection on WGS 84, centred on the municipality.</li>
        </ul>
      </MethodSection>
    </article>
  );
}
