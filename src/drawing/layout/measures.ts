/** The measures of the drawing at 100 %, in px. Storeys, slots and labels are built from these alone. */

export const FONT_PX = 12;
export const LINE_PX = 15;

/** Busbar to the top of a hanging symbol. */
export const LEAD = 38;
/** Depth of a storey that holds hanging parts: lead, symbol, five lines of text. */
export const LEAF_ZONE = 173;
/** Depth of a storey that holds only parts leading further down. */
export const TRUNK_ZONE = 116;
/** Depth of a storey with nothing below its busbars. */
export const BARE_ZONE = 30;
/** A tie between two busbars end to end, its text below it. */
export const TIE_ZONE = 106;
/** Room above the top busbars for supplies and generators. */
export const SOURCE_ZONE = 116;
/** Room above a busbar for its name and volts, or its dial. */
export const BUS_LABEL_BAND = 44;
export const BUS_LABEL_HEIGHT = 18;
export const LANE_PITCH = 12;

/** Centre of a hanging symbol below its busbar. */
export const SYMBOL_DEPTH = LEAD + 24;
/** Centre of a supply's or generator's symbol above its busbar. */
export const SOURCE_HEIGHT = 72;
/** Top of a hanging part's text below its busbar. */
export const LEAF_TEXT_DEPTH = 94;

/** Width kept for the live reading under a hanging part (three lines) and beside a part that leads on (two). */
export const LEAF_READING = 112;
export const SIDE_READING = 176;
/** Width kept for the live volts beside a busbar's name. */
export const BUS_READING = 128;

export const SLOT_GAP = 10;
export const BUS_GAP = 44;
export const ISLAND_GAP = 72;
export const BAR_INSET = 14;
export const SIDE_TEXT_OFFSET = 28;
export const ARRIVAL_PITCH = 18;
export const DIAL_RADIUS = 16;
/** Room right of a busbar for its dial and the letters of its notes. */
export const DIAL_ROOM = 64;
export const MARGIN = 28;
/** A busbar's verdict stands under its left end: parts leading on keep clear of it. */
export const BUS_MARK_ROOM = 84;
export const MARK_HEIGHT = 16;
export const MARK_WIDTH = 110;
/** Beside a hanging symbol, the word below the mark. */
export const STACKED_MARK_WIDTH = 38;
