//! Scores of a modelled series against an observed one, and the shape of its errors. Pairs with a missing value (NaN)
//! are left out.

mod duration;
mod efficiency;
mod guess;
mod humps;
mod monthly;
mod pairs;
mod rating;

pub use duration::{HIGH_FLOW_SHARE, LOW_FLOW_SHARE, exceeded_m3s, high_flow_bias, low_flow_bias, sort_flows};
pub use efficiency::{
    KlingGupta, kling_gupta_2009, kling_gupta_2012, nash_sutcliffe, nash_sutcliffe_of_logs, nash_sutcliffe_of_roots,
    percent_bias, percent_bias_on, root_mean_square_error, rsr, volumetric_efficiency,
};
pub use guess::DayOfYearMean;
pub use humps::{ErrorShape, Hump, LEAST_PROMINENCE, MOST_HUMPS, SHAPE_POINTS};
pub use monthly::{MonthMean, MonthlyMeans, monthly_skill};
pub use rating::{Rating, rate_nash_sutcliffe, rate_percent_bias, rate_rsr};
