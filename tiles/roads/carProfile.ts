/** How fast a loaded van gets along each class of road, and what a junction costs it. */
export interface CarProfile {
  /** km/h where no limit is posted. */
  classKmh: Record<string, number>;
  /** Share of a posted limit that is really driven. */
  limitShare: number;
  /** Giving way, turning, lights: per arrival at a junction of three or more real roads. */
  junctionMs: number;
}

/**
 * Class speeds and the 0.8 of posted limits: OSRM's car profile (develop 4fc76ca, BSD-2). The flat
 * three seconds a junction stand in for its turn costs, which our node-based graph cannot tell apart.
 */
export const CAR_PROFILE: CarProfile = {
  classKmh: {
    motorway: 90,
    motorway_link: 45,
    trunk: 85,
    trunk_link: 40,
    primary: 65,
    primary_link: 30,
    secondary: 55,
    secondary_link: 25,
    tertiary: 40,
    tertiary_link: 20,
    unclassified: 25,
    road: 25,
    residential: 25,
    service: 15,
    living_street: 10,
  },
  limitShare: 0.8,
  junctionMs: 3000,
};

/** Changes whenever the profile or the rules do, so that stored areas are cut anew. */
export const CAR_PROFILE_VERSION = 1;
