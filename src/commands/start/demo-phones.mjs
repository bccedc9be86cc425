// @ts-check

/**
 * The demo shop's own number and its people's phones, as the seeds make them, so that each phone can be picked up
 * before anything was texted to it.
 */
export const demoNumber = '+12025550100';

/** @type {Readonly<Record<string, string>>} */
export const demoPhones = {
  '+12025550112': 'Dana Whitlock',
  '+12025550142': 'Ana Ruiz',
  '+12025550155': 'Marek Zielony',
  '+12025550168': 'Minh Trần',
  '+12025550171': 'Lee Abbott',
  '+12025550184': 'Line 3 phone',
};
