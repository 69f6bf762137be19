#include <array>
#include <cmath>
#include <string>

#include "published/reference_operations.hpp"
#include "published/reference_reading.hpp"
#include "rainledger/losses/curve_number.hpp"
#include "rainledger/reference/composite_number.hpp"
#include "rainledger/reference/cover_numbers.hpp"
#include "rainledger/reference/horton_values.hpp"
#include "rainledger/reference/interception_values.hpp"
#include "rainledger/reference/steady_rates.hpp"
#include "rainledger/reference/storage_values.hpp"

namespace rainledger::published {
namespace {

using enum Dimension;

// --- Curve numbers by cover. ---

const CoverRow& cover(Inputs& in, const std::string& name, std::size_t i) {
    return row_at(cover_rows(), in.number(name, i));
}

double number_of(Inputs& in, const std::string& row, const std::string& group, std::size_t i) {
    return answered(cover_number(cover(in, row, i), counted<SoilGroup>(in, group, i)));
}

double cover_number_of(Inputs& in, std::size_t i) {
    return number_of(in, "row", "group", i);
}

double cover_impervious_percent(Inputs& in, std::size_t i) {
    return wanted(cover(in, "row", i).impervious_percent, "average impervious area");
}

double composite(const PartlyImpervious& area) {
    return answered(composite_number(area)).number;
}

double composite_of(Inputs& in, std::size_t i) {
    PartlyImpervious area{in.number("pervious", i), in.number("impervious_share", i)};
    if (in.has("connected_share")) area.connected_share = in.number("connected_share", i);
    return composite(area);
}

/// The composite that stands behind a row with an average impervious area.
double composite_of_row(Inputs& in, std::size_t i) {
    return composite(
        {number_of(in, "pervious_row", "group", i), cover_impervious_percent(in, i) / 100.0});
}

/// One part of a weighted number: a number, a row, or a row made partly impervious.
double part_number(Inputs& in, const std::string& part, std::size_t i) {
    if (in.has(part + "_number")) return in.number(part + "_number", i);
    const double number = number_of(in, part + "_row", part + "_group", i);
    if (!in.has(part + "_impervious")) return number;
    PartlyImpervious area{number, in.number(part + "_impervious", i)};
    if (in.has(part + "_connected")) area.connected_share = in.number(part + "_connected", i);
    return composite(area);
}

double weighted_number(Inputs& in, std::size_t i) {
    double sum = 0.0;
    double whole = 0.0;
    for (const std::string part : {"first", "second", "third"}) {
        if (!in.has(part + "_area")) continue;
        const double part_area = in.quantity(part + "_area", area, i);
        sum += part_area * part_number(in, part, i);
        whole += part_area;
    }
    return sum / whole;
}

/// TR-55 goes on with the nearest whole number.
double weighted_number_used(Inputs& in, std::size_t i) {
    return std::round(weighted_number(in, i));
}

double weighted_runoff(Inputs& in, std::size_t i) {
    CurveNumber given;
    given.number = weighted_number_used(in, i);
    return cumulative_runoff_mm(retention_curve(given, given.number),
                                in.quantity("rain", depth, i));
}

// --- Horton, storage, interception, steady rates. ---

const HortonRow& horton_row(Inputs& in, const std::string& name, std::size_t i) {
    return row_at(horton_rows(), in.number(name, i));
}

template <PublishedValue HortonRow::*column>
double horton_value(Inputs& in, std::size_t i) {
    return wanted((horton_row(in, "row", i).*column).value, "value");
}

double horton_final_low(Inputs& in, std::size_t i) {
    return wanted(horton_row(in, "row", i).final_capacity_mm_per_h.range, "range").low;
}

double horton_final_high(Inputs& in, std::size_t i) {
    return wanted(horton_row(in, "row", i).final_capacity_mm_per_h.range, "range").high;
}

double horton_initial_ratio(Inputs& in, std::size_t i) {
    return horton_value<&HortonRow::initial_capacity_mm_per_h>(in, i) /
           wanted(horton_row(in, "over_row", i).initial_capacity_mm_per_h.value, "value");
}

const StorageRow& storage(Inputs& in, std::size_t i) {
    return row_at(storage_rows(), in.number("row", i));
}

double storage_depth(Inputs& in, std::size_t i) {
    return wanted(storage(in, i).depth_mm.value, "value");
}

double storage_low(Inputs& in, std::size_t i) {
    return wanted(storage(in, i).depth_mm.range, "range").low;
}

double storage_high(Inputs& in, std::size_t i) {
    return wanted(storage(in, i).depth_mm.range, "range").high;
}

double paved_storage(Inputs& in, std::size_t i) {
    return answered(paved_depression_storage_mm(in.number("slope_percent", i)));
}

double interception(Inputs& in, std::size_t i) {
    return answered(interception_mm(row_at(interception_rows(), in.number("row", i)),
                                    in.quantity("rain", depth, i)));
}

double steady_low(Inputs& in, std::size_t i) {
    return wanted(row_at(steady_rate_rows(), in.number("row", i)).low_mm_per_h, "lower end");
}

double steady_high(Inputs& in, std::size_t i) {
    return wanted(row_at(steady_rate_rows(), in.number("row", i)).high_mm_per_h, "upper end");
}

constexpr std::array kCoverOperations{
    Operation{"cover_number", {}, cover_number_of},
    Operation{"cover_impervious_percent", {}, cover_impervious_percent},
    Operation{"composite_number", {}, composite_of},
    Operation{"composite_of_row", {}, composite_of_row},
    Operation{"weighted_number", {}, weighted_number},
    Operation{"weighted_number_used", {}, weighted_number_used},
    Operation{"weighted_runoff", depth, weighted_runoff},
    Operation{"horton_row_initial", rate, horton_value<&HortonRow::initial_capacity_mm_per_h>},
    Operation{"horton_row_final", rate, horton_value<&HortonRow::final_capacity_mm_per_h>},
    Operation{"horton_row_final_low", rate, horton_final_low},
    Operation{"horton_row_final_high", rate, horton_final_high},
    Operation{"horton_row_decay", decay, horton_value<&HortonRow::decay_per_h>},
    Operation{"horton_initial_ratio", {}, horton_initial_ratio},
    Operation{"storage_depth", depth, storage_depth},
    Operation{"storage_low", depth, storage_low},
    Operation{"storage_high", depth, storage_high},
    Operation{"paved_storage", depth, paved_storage},
    Operation{"interception", depth, interception},
    Operation{"steady_low", rate, steady_low},
    Operation{"steady_high", rate, steady_high},
};

}  // namespace

std::span<const Operation> cover_operations() {
    return kCoverOperations;
}

}  // namespace rainledger::published
