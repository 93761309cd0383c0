//! Results against sources from outside, one file a source. Each file names its source, the page or equation, the
//! tolerance and the status of the figures: `published` (read in the source or a public copy), `computed` (worked out
//! independently from the stated formula) or `memory` (of the source, not read again).

mod heating;
mod heating_grid;
mod reference;
mod resistance_cte_db_si;
mod resistance_en_1993_1_2;
mod resistance_multi_storey_guide;
mod support;

mod section_australian_tables;
mod section_catalogue_areas;
mod section_closed_forms;
mod section_cmr_780;
mod section_coating_practice;
mod section_library;
mod section_multi_storey_guide;
mod section_shapes_database;
mod section_steelwork_information;
