//! Values that others have published, one module a subject.

mod ansi_b4_1;
mod bearing;
mod bolted;
mod distributions;
mod drawn_shares;
mod expansion;
mod filled;
mod gauge_block;
mod iso2768;
mod iso286;
mod iso286_formulas;
mod iso286_tables;
mod joining;
mod mixed_sums;
mod press_fits;
mod restrained;
mod stack_ups;
mod statistics;
