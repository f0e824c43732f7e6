/** The hazards that a warning can name; signal words after ANSI Z535.4 (danger, warning, caution). */

export const HAZARDS = {
  'mains-shock': { signal: 'danger', hazard: 'Mains voltage', result: 'A shock can kill.', avoid: 'Stay clear of every conductor. One hand, insulated probe, nothing fitted or lifted.' },
  'stored-charge': { signal: 'danger', hazard: 'Stored charge', result: 'It shocks or burns long after the plug is out.', avoid: 'Discharge through the stated resistor, wait, and read it again before you touch.' },
  'live-low-voltage': { signal: 'caution', hazard: 'Live low-voltage rails', result: 'A slipped probe or a ring across them burns skin and destroys parts.', avoid: 'Take off rings and watch. Clip on while dead, or one probe and one hand.' },
  'hot-parts': { signal: 'caution', hazard: 'Hot parts', result: 'Heatsinks, lamps and load resistors burn skin.', avoid: 'Let them cool, or keep your hands away.' },
  'live-heatsink': { signal: 'danger', hazard: 'Live heatsink or tab', result: 'It carries the voltage of the part on it.', avoid: 'Treat it as a bare conductor.' },
  'rotating-parts': { signal: 'caution', hazard: 'Rotating fan', result: 'It cuts fingers and catches leads.', avoid: 'Keep fingers, hair and leads away.' },
  implosion: { signal: 'warning', hazard: 'Picture tube under vacuum', result: 'If it breaks, glass flies.', avoid: 'Goggles on. Never lift it by the neck.' },
  'beryllium-oxide': { signal: 'warning', hazard: 'Beryllium oxide in power devices', result: 'The dust harms the lungs for life.', avoid: 'Never break, grind or heat such a part.' },
  pcb: { signal: 'warning', hazard: 'PCB oil in old capacitors', result: 'It is taken up through the skin.', avoid: 'Do not touch a leaking one. Gloves, and hand it to licensed disposal.' },
  selenium: { signal: 'warning', hazard: 'Selenium rectifier', result: 'Overheated, it gives off poisonous fumes.', avoid: 'At any foul smell: power off, leave and air the room.' },
  asbestos: { signal: 'warning', hazard: 'Asbestos sheet', result: 'The fibres harm the lungs for life.', avoid: 'Do not drill, sand or rip it out. Leave it to licensed people.' },
  'lead-solder': { signal: 'caution', hazard: 'Lead solder', result: 'Lead is poisonous.', avoid: 'Air the bench and wash your hands.' },
  'bursting-capacitor': { signal: 'warning', hazard: 'Bursting capacitor', result: 'A can vents hot, caustic electrolyte.', avoid: 'Eye protection on, vents pointing away, face clear at first power.' },
  mercury: { signal: 'warning', hazard: 'Mercury switch or rectifier', result: 'Broken, it poisons the room.', avoid: 'Do not vacuum or sweep it. Leave, air, seal the waste.' },
  'x-ray': { signal: 'warning', hazard: 'High-voltage shunt regulator', result: 'It can give off X-rays without its shield.', avoid: 'Never run it with the shield off.' },
  weight: { signal: 'caution', hazard: 'Heavy transformer', result: 'It hurts backs and feet.', avoid: 'Two people lift.' },
  'lone-working': { signal: 'warning', hazard: 'Working alone', result: 'Nobody helps after a shock.', avoid: 'Have a second person within call who can find the emergency-off.' },
  'earthed-clip': { signal: 'danger', hazard: 'Earthed scope clip', result: 'On a floating circuit it makes a short, or makes the other side live to earth.', avoid: 'Clip it on while dead, never to the primary.' },
  'isolating-transformer': { signal: 'danger', hazard: 'Isolating transformer', result: 'With two loads, or an earth on its outlet, it protects nobody; an RCD does not help.', avoid: 'One load, no earth on the outlet, a second person present.' },
  'insulation-test': { signal: 'warning', hazard: 'Insulation test voltage', result: 'It shocks and leaves capacitors charged.', avoid: 'Hands off during the test. Prove dead again afterwards.' },
  solvent: { signal: 'caution', hazard: 'Cleaning alcohol', result: 'It burns.', avoid: 'Let it dry before any power.' },
} as const satisfies Record<string, { signal: 'danger' | 'warning' | 'caution'; hazard: string; result: string; avoid: string }>;

export type HazardKind = keyof typeof HAZARDS;
export const HAZARD_KINDS = Object.keys(HAZARDS) as [HazardKind, ...HazardKind[]];

/** Said at the opening of every run and in every record. */
export const FIRST_CAUTION =
  'Local electrical codes, the maker’s data and licensed practice come first. Where they and this tree differ, stop and follow them.';
