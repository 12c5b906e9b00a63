//! Pages to take home and open data: what is written, read back.

mod command;
mod net_cdf;
mod open_data;
mod page;
mod sheets;
mod square_code;
