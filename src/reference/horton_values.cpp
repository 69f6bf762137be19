#include "rainledger/reference/horton_values.hpp"

#include <array>

#include "reference/printed_units.hpp"
#include "reference/sources.hpp"

namespace rainledger {
namespace {

using printed::range;
using printed::value;

constexpr std::string_view kDecayInDoubt =
    "reprints disagree on the unit of the decay: 1/h in handbooks, 1/min with the same digits in "
    "one textbook; 1/h is taken, which fits infiltrometer runs of about an hour";

constexpr HortonRow georgia(std::string_view name, double final_cm_per_h, double initial_cm_per_h,
                            double decay_per_h) {
    return {name,
            value(initial_cm_per_h, printed::kMmPerCm),
            value(final_cm_per_h, printed::kMmPerCm),
            value(decay_per_h),
            "cm/h",
            "1/h",
            {&sources::kRawls1976, "parameters of Horton's equation by soil", Status::from_memory},
            kDecayInDoubt};
}

constexpr HortonRow akan(std::string_view name, double initial_in_per_h) {
    return {name,
            value(initial_in_per_h, printed::kMmPerInch),
            {},
            {},
            "in/h",
            "",
            {&sources::kAkan1993, "initial infiltration capacities", Status::from_memory},
            "initial capacity alone"};
}

constexpr HortonRow musgrave(std::string_view name, double low, double high) {
    return {name,
            {},
            range(low, high, printed::kMmPerInch),
            {},
            "in/h",
            "",
            {&sources::kMusgrave1955, "minimum infiltration rates by soil group", Status::confirmed,
             "in a lecture slide, Watersheds in Austin Area"},
            "final capacity alone, a range"};
}

constexpr HortonRow notes(std::string_view name, double initial, double low, double high,
                          double decay_per_h, Status status) {
    return {name,
            value(initial),
            range(low, high),
            value(decay_per_h),
            "mm/h",
            "1/h",
            {&sources::kInfiltrationNotes, "table 4.1", status},
            "the final capacity is a range alone"};
}

constexpr HortonRow manual(std::string_view name, double initial_in_per_h, double final_in_per_h,
                           double decay_per_s) {
    return {name,
            value(initial_in_per_h, printed::kMmPerInch),
            value(final_in_per_h, printed::kMmPerInch),
            value(decay_per_s, printed::kSecondsPerHour),
            "in/h",
            "1/s",
            {&sources::kDrainageManual1984, "RUNOFF, values for equation 2-1", Status::from_memory,
             "form and units of the equation confirmed"},
            "the manual writes fi for the initial and fo for the final capacity"};
}

constexpr std::array kRows = std::to_array<HortonRow>({
    georgia("Alphalpha loamy sand", 3.56, 48.26, 38.29),
    georgia("Carnegie sandy loam", 4.50, 37.52, 19.64),
    georgia("Cowarts loamy sand", 4.95, 38.81, 10.65),
    georgia("Dothan loamy sand", 6.68, 8.81, 1.40),
    georgia("Fuquay pebbly loamy sand", 6.15, 15.85, 4.70),
    georgia("Leefield loamy sand", 4.39, 28.80, 7.70),
    georgia("Robertsdale loamy sand", 2.99, 31.52, 21.75),
    georgia("Stilson loamy sand", 3.94, 20.60, 6.55),
    georgia("Tooup sand", 4.57, 58.45, 32.71),
    georgia("Tifton loamy sand", 4.14, 24.56, 7.28),
    akan("sandy soil, dry, little or no vegetation", 5.0),
    akan("loam, dry, little or no vegetation", 3.0),
    akan("clay, dry, little or no vegetation", 1.0),
    akan("sandy soil, dry, dense vegetation", 10.0),
    akan("loam, dry, dense vegetation", 6.0),
    akan("clay, dry, dense vegetation", 2.0),
    akan("sandy soil, moist, little or no vegetation", 1.7),
    akan("loam, moist, little or no vegetation", 1.0),
    akan("clay, moist, little or no vegetation", 0.3),
    akan("sandy soil, moist, dense vegetation", 3.3),
    akan("loam, moist, dense vegetation", 2.0),
    akan("clay, moist, dense vegetation", 0.7),
    musgrave("soil group A", 0.30, 0.45),
    musgrave("soil group B", 0.15, 0.30),
    musgrave("soil group C", 0.05, 0.15),
    musgrave("soil group D", 0.0, 0.05),
    HortonRow{"decay where nothing is known",
              {},
              {},
              value(4.14),
              "",
              "1/h",
              {&sources::kAkan1992, "decay recommended in general", Status::from_memory},
              "decay alone"},
    notes("bare agricultural soil", 280.0, 6.0, 220.0, 1.6, Status::confirmed),
    notes("vegetated agricultural soil", 900.0, 20.0, 290.0, 0.8, Status::from_memory),
    notes("peat", 325.0, 2.0, 29.0, 1.8, Status::from_memory),
    notes("fine sandy clay, bare", 210.0, 2.0, 25.0, 2.0, Status::from_memory),
    notes("fine sandy clay, vegetated", 670.0, 10.0, 30.0, 1.4, Status::from_memory),
    manual("soil group A, Denver region", 5.0, 1.0, 0.0007),
    manual("soil group B, Denver region", 4.5, 0.6, 0.0018),
    manual("soil group C, Denver region", 3.0, 0.5, 0.0018),
    manual("soil group D, Denver region", 3.0, 0.5, 0.0018),
});

}  // namespace

std::span<const HortonRow> horton_rows() {
    return kRows;
}

RowView view_of(const HortonRow& row) {
    RowView view{std::string(row.name),
                 {{"initial_capacity_mm_per_h", "initial capacity", Dimension::rate, row.rate_unit,
                   row.initial_capacity_mm_per_h},
                  {"final_capacity_mm_per_h", "final capacity", Dimension::rate, row.rate_unit,
                   row.final_capacity_mm_per_h},
                  {"decay_per_h", "decay", Dimension::decay, row.decay_unit, row.decay_per_h}},
                 {},
                 row.provenance};
    if (!row.note.empty()) view.notes.push_back(row.note);
    return view;
}

}  // namespace rainledger
