//! Every drop accounted: what came in, what went out, what the stores gained, and the remainder.
//!
//! All in m³. The reservoir's store is its active content: dead storage neither comes nor goes.

use super::keyed::keyed;
use super::lanes::most;
use super::units::M3_PER_MM_KM2;
use super::works::Evening;

keyed! {
    /// A store of water.
    Store, STORES {
        /// Snow on the bands.
        Snow => "snow",
        /// Soil of the bands.
        Soil => "soil",
        /// The two ground stores.
        Ground => "ground",
        /// Under way to the dam.
        Channel => "channel",
        /// Active content of the reservoir.
        Reservoir => "reservoir",
        /// Root zones of the fields.
        RootZones => "root_zones",
        /// On its way back to the river.
        Returning => "returning",
    }
}

keyed! {
    /// A flow of water.
    Flow, FLOWS {
        /// In: rain and snow on the bands.
        BasinPrecipitation => "basin_precipitation",
        /// In: rain on the lake.
        LakeRain => "lake_rain",
        /// In: rain on the fields.
        FieldRain => "field_rain",
        /// In: put into the reservoir by the starting-storage dial.
        StorageSetIn => "storage_set_in",
        /// Out: evaporation from the soil of the bands.
        BasinEvaporation => "basin_evaporation",
        /// Out: snow lost to the air.
        Sublimation => "sublimation",
        /// Out: evaporation from the lake.
        LakeEvaporation => "lake_evaporation",
        /// Out: what crops and fields give to the air.
        FieldEvaporation => "field_evaporation",
        /// Out: used up by towns.
        TownUse => "town_use",
        /// Out: lost at depth from canals and fields.
        DeepLoss => "deep_loss",
        /// Out: stored water lost in the river on its way to the gates.
        RiverLoss => "river_loss",
        /// Out: flow at the river's end.
        RiverOut => "river_out",
        /// Out: taken from the reservoir by the starting-storage dial.
        StorageSetOut => "storage_set_out",
        /// Within: natural flow that reached the dam.
        NaturalInflow => "natural_inflow",
        /// Within: natural flow kept by the reservoir, under its right or because the outlet could not pass it.
        ReservoirTake => "reservoir_take",
        /// Within: natural flow into canals.
        NaturalTake => "natural_take",
        /// Within: stored water let go for gates.
        StoredRelease => "stored_release",
        /// Within: into all canals at their heads.
        Canals => "canals",
        /// Within: lost on the way in canals.
        ConveyanceLoss => "conveyance_loss",
        /// Within: lost on the fields.
        FieldLoss => "field_loss",
        /// Within: came back to the river.
        ReturnFlow => "return_flow",
        /// Within: stored water let go for the river minimum.
        MinimumRelease => "minimum_release",
        /// Within: stored water let go for flood space.
        FloodRelease => "flood_release",
        /// Within: natural flow that the outlet could not carry, and stored water over the spillway.
        Spill => "spill",
    }
}

/// Which side of the accounts a flow is on.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Side {
    /// Into the valley.
    In,
    /// Out of the valley.
    Out,
    /// From one store of the valley to another.
    Within,
}

impl Flow {
    /// The flow's side.
    pub const fn side(self) -> Side {
        match self {
            Flow::BasinPrecipitation | Flow::LakeRain | Flow::FieldRain | Flow::StorageSetIn => Side::In,
            Flow::BasinEvaporation
            | Flow::Sublimation
            | Flow::LakeEvaporation
            | Flow::FieldEvaporation
            | Flow::TownUse
            | Flow::DeepLoss
            | Flow::RiverLoss
            | Flow::RiverOut
            | Flow::StorageSetOut => Side::Out,
            _ => Side::Within,
        }
    }
}

/// What is in store at one moment, m³.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct Stores(pub [f64; STORES]);

impl Stores {
    /// One store, m³.
    pub fn of(&self, store: Store) -> f64 {
        self.0[store as usize]
    }

    /// All of them, m³.
    pub fn total_m3(&self) -> f64 {
        self.0.iter().sum()
    }
}

/// The accounts of a span of days, m³.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct Ledger {
    flows_m3: [f64; FLOWS],
    /// In store on the first morning.
    pub start: Stores,
    /// In store in the last evening.
    pub end: Stores,
}

impl Ledger {
    /// An open ledger that starts with `start`.
    pub fn open(start: Stores) -> Self {
        Self { start, end: start, ..Self::default() }
    }

    /// One flow over the span, m³.
    pub fn of(&self, flow: Flow) -> f64 {
        self.flows_m3[flow as usize]
    }

    /// Enters a day. Depths of the basin are over `band_area_km2`.
    pub fn enter(&mut self, day: &Evening, band_area_km2: f64) {
        let m3_per_mm = band_area_km2 * M3_PER_MM_KM2;
        let (basin, river) = (&day.basin, &day.river);
        let mut add = |flow: Flow, volume_m3: f64| self.flows_m3[flow as usize] += volume_m3;
        add(Flow::BasinPrecipitation, basin.precipitation_mm * m3_per_mm);
        add(Flow::LakeRain, day.lake_rain_m3);
        add(Flow::StorageSetIn, most(day.set_storage_m3, 0.0));
        add(Flow::BasinEvaporation, basin.evaporation_mm * m3_per_mm);
        add(Flow::Sublimation, basin.sublimation_mm * m3_per_mm);
        add(Flow::LakeEvaporation, river.evaporation_m3);
        add(Flow::DeepLoss, day.deep_loss_m3);
        add(Flow::RiverLoss, river.river_loss_m3);
        add(Flow::RiverOut, river.river_out_m3);
        add(Flow::StorageSetOut, most(-day.set_storage_m3, 0.0));
        add(Flow::NaturalInflow, basin.inflow_m3);
        add(Flow::ReservoirTake, river.reservoir_take_m3 + river.detained_m3);
        add(Flow::StoredRelease, river.stored_release_m3);
        add(Flow::Canals, river.canal_total_m3);
        add(Flow::ReturnFlow, river.return_flow_total_m3);
        add(Flow::MinimumRelease, river.pool_release_m3);
        add(Flow::FloodRelease, river.flood_release_m3);
        add(Flow::Spill, day.spill_m3);
        for gate in 0..day.gates {
            let fields = &day.fields[gate];
            add(Flow::FieldRain, fields.rain_m3);
            add(Flow::FieldEvaporation, fields.evaporation_m3);
            add(Flow::FieldLoss, fields.lost_m3);
            add(Flow::TownUse, day.town_used_m3[gate]);
            add(Flow::NaturalTake, river.natural_take_m3[gate]);
            add(Flow::ConveyanceLoss, day.conveyance_loss_m3[gate]);
        }
    }

    /// Adds the flows of a later ledger; the span then reaches to its end.
    pub fn append(&mut self, later: &Ledger) {
        for (flow_m3, later_m3) in self.flows_m3.iter_mut().zip(later.flows_m3) {
            *flow_m3 += later_m3;
        }
        self.end = later.end;
    }

    fn sum_m3(&self, side: Side) -> f64 {
        Flow::ALL.into_iter().filter(|flow| flow.side() == side).map(|flow| self.of(flow)).sum()
    }

    /// All that came in, m³.
    pub fn in_m3(&self) -> f64 {
        self.sum_m3(Side::In)
    }

    /// All that went out, m³.
    pub fn out_m3(&self) -> f64 {
        self.sum_m3(Side::Out)
    }

    /// What is not explained, m³: in less out less what the stores gained.
    pub fn residual_m3(&self) -> f64 {
        self.in_m3() - self.out_m3() - (self.end.total_m3() - self.start.total_m3())
    }

    /// The remainder over throughput, the larger of in and out; 0 where nothing moved.
    pub fn residual_share(&self) -> f64 {
        let throughput_m3 = most(self.in_m3(), self.out_m3());
        if throughput_m3 > 0.0 { self.residual_m3() / throughput_m3 } else { 0.0 }
    }
}
