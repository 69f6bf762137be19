#pragma once

#include <array>
#include <cstddef>
#include <limits>
#include <optional>
#include <string>
#include <vector>

#include "rainledger/ledger/surface.hpp"
#include "rainledger/rain/hyetograph.hpp"

// The ledger of a site under one storm: where every millimetre of rain went, per surface, per place
// drained to and for the whole site.
//
//   rain + run-on = initial loss + infiltrated + change in ponded depth + excess
namespace rainledger {

/// One step's accounts, or a total, in mm over the area they belong to.
struct Accounts {
    double rain_mm = 0.0;
    double run_on_mm = 0.0;  ///< may be negative for a place: arriving less sent elsewhere
    double initial_loss_mm = 0.0;
    double infiltrated_mm = 0.0;
    double ponded_mm = 0.0;  ///< depth held at the end
    double excess_mm = 0.0;
};

/// One row of the ledger.
struct LedgerRow {
    Accounts accounts;
    /// Infiltration capacity at the step's end, mm/h. Infinite where unlimited; NaN where there is
    /// none to speak of (a curve number, an area-weighted row).
    double capacity_mm_per_h = std::numeric_limits<double>::quiet_NaN();
};

/// A time during which infiltration was limited by capacity, a draining pond included.
struct PondedInterval {
    double start_h = 0.0;
    std::optional<double> end_h;  ///< empty: still ponded at the end of the record
};

/// Windows of the worst-window flows, minutes.
inline constexpr std::array<int, 4> kWindowsMinutes{5, 10, 15, 30};

/// What an area's excess amounts to.
struct ExcessFigures {
    double excess_volume_m3 = 0.0;
    /// Excess over rain (volumes); empty without rain. Not the C of the rational method.
    std::optional<double> volumetric_runoff_coefficient;
    /// Largest mean excess over one of the storm's own steps, mm/h.
    double peak_excess_mm_per_h = 0.0;
    /// Excess averaged over the worst 5, 10, 15 and 30 minutes times the area, L/s, before any
    /// travel time; windows slide over the step means and are dry outside the record.
    std::array<double, kWindowsMinutes.size()> worst_flow_l_per_s{};
};

/// The ledger of one surface.
struct SurfaceLedger {
    std::vector<LedgerRow> rows;  ///< one per step
    Accounts total;
    std::vector<PondedInterval> ponding;
    std::optional<double> runoff_start_h;
    double closure_mm = 0.0;  ///< largest absolute error of any step or of the total
    std::optional<double> phi_index_mm_per_h;  ///< the rate matched, for a phi index
    ExcessFigures figures;
};

/// The ledger of a place drained to, or of the whole site: area-weighted over its surfaces.
struct PlaceLedger {
    std::string name;  ///< empty for the site
    double area_m2 = 0.0;
    std::vector<LedgerRow> rows;
    Accounts total;
    std::optional<double> ponding_start_h;  ///< the earliest of its surfaces
    std::optional<double> runoff_start_h;   ///< first excess of a surface that reaches the place
    double closure_mm = 0.0;
    ExcessFigures figures;
};

/// A phi index that cannot be matched: more excess observed than even a rate of zero leaves.
struct UnmatchedPhi {
    std::size_t surface = 0;
    double observed_mm = 0.0;
    double most_mm = 0.0;  ///< the excess at rate zero
};

/// Run-on below a giver that infiltrates, handed over in parts of a step that even the finest cut
/// leaves coarser than intended: inside a part a receiver's supply may be off by this depth.
struct CoarseRunOn {
    double difference_mm = 0.0;
};

/// The ledger of the site.
struct SiteLedger {
    std::vector<SurfaceLedger> surfaces;  ///< in the site's order
    std::vector<PlaceLedger> places;      ///< in order of first mention
    PlaceLedger site;
    std::vector<UnmatchedPhi> unmatched;  ///< when not empty, the rest is not to be used
    std::optional<CoarseRunOn> coarse_run_on;
};

/// Marches a storm over the site and books it. The site and the storm are valid.
[[nodiscard]] SiteLedger keep_ledger(const Site& site, const Hyetograph& rain);

/// The rows of a ledger at steps of another length.
struct ReportedLedger {
    std::vector<double> edges_h;  ///< rows + 1
    SiteLedger ledger;            ///< rows per reporting step; all else as marched
};

/// The ledger `marched` (keep_ledger's of the same site and storm) with its rows reported at steps
/// of `every_h` > 0 from the first step's start, the last one shorter. The rows come from a march
/// that is cut at those steps' edges as well, so finer reports are exact.
[[nodiscard]] ReportedLedger report_every(const Site& site, const Hyetograph& rain, double every_h,
                                          SiteLedger marched);

/// Totals of one surface, marched without run-on and without a stored series (nothing is allocated
/// per step).
[[nodiscard]] Accounts march_totals(const Surface& surface, const Hyetograph& rain);

}  // namespace rainledger
