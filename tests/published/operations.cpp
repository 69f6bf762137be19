#include "published/operations.hpp"

#include <array>
#include <numeric>
#include <span>
#include <stdexcept>
#include <string>

#include "published/design_operations.hpp"
#include "published/fieldtest_operations.hpp"
#include "published/reference_operations.hpp"
#include "published/statistics_operations.hpp"
#include "rainledger/ledger/surface.hpp"
#include "rainledger/losses/curve_number.hpp"
#include "rainledger/losses/green_ampt.hpp"
#include "rainledger/losses/horton.hpp"
#include "rainledger/losses/philip.hpp"
#include "rainledger/reference/antecedent.hpp"

namespace rainledger::published {
namespace {

using enum Dimension;

double rain_of(Inputs& in, std::size_t i) {
    return in.quantity("rain_rate", rate, i);
}

// --- Green and Ampt. K mm/h, S mm, as in losses/green_ampt.hpp. ---

/// The deficit as sources give it: itself, two water contents, or a porosity and a saturation.
double moisture_deficit(Inputs& in, std::size_t i) {
    if (in.has("moisture_deficit")) return in.number("moisture_deficit", i);
    if (in.has("initial_content"))
        return in.number("porosity", i) - in.number("initial_content", i);
    return in.number("effective_porosity", i) * (1.0 - in.number("effective_saturation", i));
}

struct Soil {
    double K;
    double S;
};

Soil soil(Inputs& in, std::size_t i) {
    const double K = in.quantity("conductivity", rate, i);
    if (in.has("suction_deficit")) return {K, in.quantity("suction_deficit", depth, i)};
    return {K, in.quantity("suction", suction, i) * moisture_deficit(in, i)};
}

double ga_cumulative(Inputs& in, std::size_t i) {
    const auto [K, S] = soil(in, i);
    return green_ampt_cumulative(K, S, in.quantity("time", time, i));
}

double ga_capacity(Inputs& in, std::size_t i) {
    const auto [K, S] = soil(in, i);
    return green_ampt_capacity(
        K, S, in.has("depth") ? in.quantity("depth", depth, i) : ga_cumulative(in, i));
}

double ga_ponding_time(Inputs& in, std::size_t i) {
    const auto [K, S] = soil(in, i);
    return green_ampt_ponding_time(K, S, rain_of(in, i));
}

double ga_ponding_depth(Inputs& in, std::size_t i) {
    return ga_ponding_time(in, i) * rain_of(in, i);
}

double ga_front_depth_at_ponding(Inputs& in, std::size_t i) {
    return ga_ponding_depth(in, i) / moisture_deficit(in, i);
}

double ga_cumulative_under_rain(Inputs& in, std::size_t i) {
    const auto [K, S] = soil(in, i);
    const double ponded_at = ga_ponding_time(in, i);
    const double F_ponding = ponded_at * rain_of(in, i);
    return F_ponding + green_ampt_growth(K, S, F_ponding, in.quantity("time", time, i) - ponded_at);
}

double ga_capacity_under_rain(Inputs& in, std::size_t i) {
    const auto [K, S] = soil(in, i);
    return green_ampt_capacity(K, S, ga_cumulative_under_rain(in, i));
}

double ga_dimensionless_depth(Inputs& in, std::size_t i) {
    return green_ampt_cumulative(1.0, 1.0, in.number("dimensionless_time", i));
}

double ga_dimensionless_capacity(Inputs& in, std::size_t i) {
    return green_ampt_capacity(1.0, 1.0, ga_dimensionless_depth(in, i));
}

double ga_ponding_time_ratio(Inputs& in, std::size_t i) {
    const auto [K, S] = soil(in, i);
    return K * green_ampt_ponding_time(K, S, K * in.number("rain_over_conductivity", i)) / S;
}

double ga_ponding_depth_ratio(Inputs& in, std::size_t i) {
    return ga_ponding_time_ratio(in, i) * in.number("rain_over_conductivity", i);
}

// --- Horton. ---

HortonCurve horton(Inputs& in, std::size_t i) {
    return {in.quantity("initial_capacity", rate, i), in.quantity("final_capacity", rate, i),
            in.quantity("decay", decay, i)};
}

double horton_capacity_at(Inputs& in, std::size_t i) {
    return horton_capacity(horton(in, i), in.quantity("time", time, i));
}

double horton_cumulative_at(Inputs& in, std::size_t i) {
    return horton_cumulative(horton(in, i), in.quantity("time", time, i));
}

double horton_ponding_at(Inputs& in, std::size_t i) {
    return horton_ponding_time(horton(in, i), rain_of(in, i));
}

double horton_ponding_depth(Inputs& in, std::size_t i) {
    return horton_ponding_at(in, i) * rain_of(in, i);
}

double horton_curve_time_at_ponding(Inputs& in, std::size_t i) {
    return horton_time_at_depth(horton(in, i), horton_ponding_depth(in, i));
}

// --- Philip. ---

double philip_cumulative_at(Inputs& in, std::size_t i) {
    return philip_cumulative(in.quantity("sorptivity", sorptivity, i),
                             in.quantity("steady_term", rate, i), in.quantity("time", time, i));
}

double philip_ponding_at(Inputs& in, std::size_t i) {
    return philip_ponding_time(in.quantity("sorptivity", sorptivity, i),
                               in.quantity("steady_term", rate, i), rain_of(in, i));
}

double philip_ponding_depth(Inputs& in, std::size_t i) {
    return philip_ponding_at(in, i) * rain_of(in, i);
}

// --- The curve number. ---

CurveNumber numbered(Inputs& in, std::size_t i, AntecedentCondition antecedent) {
    CurveNumber given;
    if (!in.has("retention")) given.number = in.number("number", i);
    given.antecedent = antecedent;
    if (in.has("initial_abstraction_ratio"))
        given.initial_abstraction_ratio = in.number("initial_abstraction_ratio", i);
    if (in.has("tabulated_ratio")) given.tabulated_ratio = in.number("tabulated_ratio", i);
    return given;
}

RetentionCurve retention(Inputs& in, std::size_t i) {
    const CurveNumber given = numbered(in, i, AntecedentCondition::II);
    if (!in.has("retention")) return retention_curve(given);
    const double S = in.quantity("retention", depth, i);
    return {S, given.initial_abstraction_ratio * S};
}

double retention_of(Inputs& in, std::size_t i) {
    return retention(in, i).retention_mm;
}

double initial_abstraction_of(Inputs& in, std::size_t i) {
    return retention(in, i).initial_abstraction_mm;
}

double number_of_retention(Inputs& in, std::size_t i) {
    return curve_number_of(retention_of(in, i));
}

double runoff_depth(Inputs& in, std::size_t i) {
    return cumulative_runoff_mm(retention(in, i), in.quantity("rain", depth, i));
}

double number_for_condition_1(Inputs& in, std::size_t i) {
    return converted_number(numbered(in, i, AntecedentCondition::I));
}

double number_for_condition_3(Inputs& in, std::size_t i) {
    return converted_number(numbered(in, i, AntecedentCondition::III));
}

const AntecedentRow& antecedent_row(Inputs& in, std::size_t i) {
    const double number = in.number("number", i);
    for (const AntecedentRow& row : antecedent_table())
        if (static_cast<double>(row.condition_2) == number) return row;
    throw std::runtime_error("no row for this number in the antecedent table");
}

double antecedent_row_1(Inputs& in, std::size_t i) {
    return antecedent_row(in, i).condition_1;
}

double antecedent_row_3(Inputs& in, std::size_t i) {
    return antecedent_row(in, i).condition_3;
}

// --- Volumes and depths, where the source works through them. ---

constexpr double kMmPerM = 1000.0;
constexpr double kLitresPerM3 = 1000.0;
constexpr double kSecondsPerHour = 3600.0;

double depth_of_volume(Inputs& in, std::size_t i) {
    return kMmPerM * in.quantity("volume", volume, i) / in.quantity("area", area, i);
}

double volume_of_depth(Inputs& in, std::size_t i) {
    return in.quantity("depth", depth, i) / kMmPerM * in.quantity("area", area, i);
}

double depth_of_flows(Inputs& in, std::size_t i) {
    const auto flows = in.series("flows", discharge);
    const double sum = std::accumulate(flows.begin(), flows.end(), 0.0) / kLitresPerM3;
    const double seconds = kSecondsPerHour * in.quantity("every", time, i);
    return kMmPerM * sum * seconds / in.quantity("area", area, i);
}

double difference(Inputs& in, std::size_t i) {
    return in.quantity("to", depth, i) - in.quantity("from", depth, i);
}

constexpr std::array kOperations{
    Operation{"green_ampt_cumulative", depth, ga_cumulative},
    Operation{"green_ampt_capacity", rate, ga_capacity},
    Operation{"green_ampt_ponding_time", time, ga_ponding_time},
    Operation{"green_ampt_ponding_depth", depth, ga_ponding_depth},
    Operation{"green_ampt_front_depth_at_ponding", depth, ga_front_depth_at_ponding},
    Operation{"green_ampt_cumulative_under_rain", depth, ga_cumulative_under_rain},
    Operation{"green_ampt_capacity_under_rain", rate, ga_capacity_under_rain},
    Operation{"green_ampt_dimensionless_depth", {}, ga_dimensionless_depth},
    Operation{"green_ampt_dimensionless_capacity", {}, ga_dimensionless_capacity},
    Operation{"green_ampt_ponding_time_ratio", {}, ga_ponding_time_ratio},
    Operation{"green_ampt_ponding_depth_ratio", {}, ga_ponding_depth_ratio},
    Operation{"horton_capacity", rate, horton_capacity_at},
    Operation{"horton_cumulative", depth, horton_cumulative_at},
    Operation{"horton_ponding_time", time, horton_ponding_at},
    Operation{"horton_ponding_depth", depth, horton_ponding_depth},
    Operation{"horton_curve_time_at_ponding", time, horton_curve_time_at_ponding},
    Operation{"philip_cumulative", depth, philip_cumulative_at},
    Operation{"philip_ponding_time", time, philip_ponding_at},
    Operation{"philip_ponding_depth", depth, philip_ponding_depth},
    Operation{"retention", depth, retention_of},
    Operation{"initial_abstraction", depth, initial_abstraction_of},
    Operation{"number_of_retention", {}, number_of_retention},
    Operation{"runoff_depth", depth, runoff_depth},
    Operation{"number_for_condition_1", {}, number_for_condition_1},
    Operation{"number_for_condition_3", {}, number_for_condition_3},
    Operation{"antecedent_row_1", {}, antecedent_row_1},
    Operation{"antecedent_row_3", {}, antecedent_row_3},
    Operation{"depth_of_volume", depth, depth_of_volume},
    Operation{"volume_of_depth", volume, volume_of_depth},
    Operation{"depth_of_flows", depth, depth_of_flows},
    Operation{"difference", depth, difference},
};

}  // namespace

const Operation& find_operation(std::string_view name) {
    for (const std::span<const Operation> list :
         {std::span<const Operation>(kOperations), design_operations(), statistics_operations(),
          soil_operations(), cover_operations(), fieldtest_operations()})
        for (const Operation& operation : list)
            if (operation.name == name) return operation;
    throw std::runtime_error("unknown operation '" + std::string(name) + "'");
}

}  // namespace rainledger::published
