import { Foundation1764547200000 } from './1764547200000-foundation.ts';
import { StudSpecies1764590400000 } from './1764590400000-stud-species.ts';
import { HangerSlides1764590460000 } from './1764590460000-hanger-slides.ts';
import { PhotoFit1764594000000 } from './1764594000000-photo-fit.ts';
import { Printers1764597600000 } from './1764597600000-printers.ts';
import { WallOutline1764601200000 } from './1764601200000-wall-outline.ts';

/** Oldest first. */
export const migrations = [Foundation1764547200000, StudSpecies1764590400000, HangerSlides1764590460000, PhotoFit1764594000000, Printers1764597600000, WallOutline1764601200000];
