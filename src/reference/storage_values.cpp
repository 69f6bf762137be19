#include "rainledger/reference/storage_values.hpp"

#include <array>
#include <cmath>
#include <string>

#include "reference/printed_units.hpp"
#include "reference/sources.hpp"

namespace rainledger {
namespace {

using enum StorageKind;
using printed::kMmPerInch;

constexpr PublishedValue in(double figure) {
    return printed::value(figure, kMmPerInch);
}
constexpr PublishedValue in(double low, double high) {
    return printed::range(low, high, kMmPerInch);
}
/// A recommended figure within a range.
constexpr PublishedValue in(double figure, double low, double high) {
    return printed::value(figure, low, high, kMmPerInch);
}

constexpr std::string_view kQuoted =
    "quoted in the Hydrologic Design Manual for Maricopa County, rainfall losses";

constexpr Provenance kTholinKeiferQuoted{&sources::kTholinKeifer1960, "depression storage",
                                         Status::confirmed, kQuoted};
constexpr Provenance kTholinKeifer{&sources::kTholinKeifer1960, "depression storage, Chicago",
                                   Status::from_memory};
constexpr Provenance kViessman{&sources::kViessman1967, "depression storage by slope",
                               Status::confirmed, kQuoted};
constexpr Provenance kSabol{&sources::kSabol1983, "urban watershed, Albuquerque", Status::confirmed,
                            kQuoted};
constexpr Provenance kHicks{&sources::kHicks1944, "depression storage by soil", Status::from_memory,
                            "that the estimates exist is confirmed"};
constexpr Provenance kAsce{&sources::kAsce1992, "depression storage by cover", Status::from_memory};
constexpr Provenance kMaricopa{&sources::kMaricopa, "table 4.1, surface retention",
                               Status::confirmed};
constexpr Provenance kManual{&sources::kDrainageManual1984, "RUNOFF, table 2-1", Status::confirmed};
constexpr Provenance kPaved{&sources::kKidd1978, "depression storage of paved surfaces by slope",
                            Status::from_memory};

constexpr StorageRow row(std::string_view name, StorageKind kind, PublishedValue depth_mm,
                         const Provenance& provenance, std::string_view note = {}) {
    return {name, kind, depth_mm, "in", provenance, note};
}

constexpr std::array kRows = std::to_array<StorageRow>({
    row("impervious", depression, in(0.0625, 0.125), kTholinKeiferQuoted),
    row("impervious at 1 % slope", depression, in(0.11), kViessman),
    row("impervious at 2.5 % slope", depression, in(0.06), kViessman),
    row("urban watershed", depression, in(0.04), kSabol),
    row("sand", depression, in(0.20), kHicks),
    row("loam", depression, in(0.15), kHicks),
    row("clay", depression, in(0.10), kHicks),
    row("pervious urban", depression, in(0.25), kTholinKeifer),
    row("impervious", depression, in(0.0625), kTholinKeifer),
    row("impervious", depression, in(0.05, 0.10), kAsce),
    row("lawns", depression, in(0.10, 0.20), kAsce),
    row("pasture", depression, in(0.20), kAsce),
    row("forest litter", depression, in(0.30), kAsce),
    row("desert and rangeland, flat", retention, in(0.35), kMaricopa),
    row("hillslopes, Sonoran desert", retention, in(0.15), kMaricopa),
    row("mountain, vegetated", retention, in(0.25), kMaricopa),
    row("lawn and turf", retention, in(0.20), kMaricopa),
    row("desert landscape", retention, in(0.10), kMaricopa),
    row("pavement", retention, in(0.05), kMaricopa),
    row("tilled fields and irrigated pasture", retention, in(0.50), kMaricopa),
    row("large paved areas", retention, in(0.1, 0.05, 0.15), kManual),
    row("flat roofs", retention, in(0.1, 0.1, 0.3), kManual),
    row("sloped roofs", retention, in(0.05, 0.05, 0.1), kManual),
    row("lawn grass", retention, in(0.35, 0.2, 0.5), kManual),
    row("wooded areas and open fields", retention, in(0.4, 0.2, 0.6), kManual),
});

constexpr std::array<std::string_view, 2> kKindNames{"depression storage", "surface retention"};

}  // namespace

std::string_view storage_kind_name(StorageKind kind) {
    return kKindNames[static_cast<std::size_t>(kind)];
}

std::span<const StorageRow> storage_rows() {
    return kRows;
}

RowView view_of(const StorageRow& row) {
    RowView view{std::string(row.name), {}, {}, row.provenance};
    view.values.push_back(
        {row.kind == depression ? "depression_storage_mm" : "surface_retention_mm",
         storage_kind_name(row.kind), Dimension::depth, row.printed_unit, row.depth_mm});
    if (!row.note.empty()) view.notes.push_back(row.note);
    return view;
}

Answer<double> paved_depression_storage_mm(double slope_percent) {
    if (!(slope_percent > 0.0) || !std::isfinite(slope_percent))
        return refusal<double>("the slope must be above 0, and finite");
    return {0.77 * std::pow(slope_percent, -0.49), {}, {}};
}

const Provenance& paved_depression_provenance() {
    return kPaved;
}

}  // namespace rainledger
