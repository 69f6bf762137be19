#include <array>
#include <cmath>

#include "published/reference_operations.hpp"
#include "published/reference_reading.hpp"
#include "rainledger/reference/pedotransfer.hpp"
#include "rainledger/reference/soil_group.hpp"
#include "rainledger/reference/soil_texture.hpp"
#include "rainledger/reference/texture_triangle.hpp"

namespace rainledger::published {
namespace {

using enum Dimension;

// --- Soil by texture. ---

const GreenAmptTexture& green_ampt(Inputs& in, std::size_t i) {
    const auto* row = green_ampt_texture(counted<TextureClass>(in, "texture", i));
    if (row == nullptr) throw std::runtime_error("no row for this texture");
    return *row;
}

const SoilWaterTexture& soil_water(Inputs& in, std::size_t i) {
    const auto* row = soil_water_texture(counted<TextureClass>(in, "texture", i));
    if (row == nullptr) throw std::runtime_error("no row for this texture");
    return *row;
}

using Column = PublishedValue GreenAmptTexture::*;
using FaultColumn = std::optional<PrintedFault> GreenAmptTexture::*;

template <Column column>
double green_ampt_value(Inputs& in, std::size_t i) {
    return wanted((green_ampt(in, i).*column).value, "value");
}

template <Column column>
ValueRange green_ampt_range(Inputs& in, std::size_t i) {
    return wanted((green_ampt(in, i).*column).range, "range");
}

template <Column column>
double green_ampt_low(Inputs& in, std::size_t i) {
    return green_ampt_range<column>(in, i).low;
}

template <Column column>
double green_ampt_high(Inputs& in, std::size_t i) {
    return green_ampt_range<column>(in, i).high;
}

template <Column column>
double green_ampt_middle(Inputs& in, std::size_t i) {
    const ValueRange range = green_ampt_range<column>(in, i);
    return 0.5 * (range.low + range.high);
}

double green_ampt_suction_middle(Inputs& in, std::size_t i) {
    const ValueRange range = green_ampt_range<&GreenAmptTexture::suction_mm>(in, i);
    return std::sqrt(range.low * range.high);
}

template <FaultColumn column>
double corrected(Inputs& in, std::size_t i) {
    return wanted(wanted(green_ampt(in, i).*column, "fault").corrected, "corrected value");
}

double corrected_porosity_middle(Inputs& in, std::size_t i) {
    const auto fault = wanted(green_ampt(in, i).porosity_fault, "fault");
    const ValueRange range = wanted(fault.corrected_range, "corrected range");
    return 0.5 * (range.low + range.high);
}

template <PublishedValue SoilWaterTexture::*column>
double soil_water_value(Inputs& in, std::size_t i) {
    return wanted((soil_water(in, i).*column).value, "value");
}

double soil_water_half_conductivity(Inputs& in, std::size_t i) {
    return kBouwerShare *
           soil_water_value<&SoilWaterTexture::saturated_conductivity_mm_per_h>(in, i);
}

ParticleShares shares(Inputs& in, std::size_t i) {
    return {in.number("sand", i), in.number("clay", i)};
}

double texture_number(Inputs& in, std::size_t i) {
    return count_of(answered(texture_of(shares(in, i))));
}

double soil_group_by_texture(Inputs& in, std::size_t i) {
    return count_of(
        wanted(soil_group_of_texture(counted<TextureClass>(in, "texture", i)), "group"));
}

// --- Regressions. ---

template <double RawlsBrakensiekSoil::*member>
double regressed(Inputs& in, std::size_t i) {
    return answered(rawls_brakensiek_soil(shares(in, i), in.number("porosity", i))).*member;
}

template <double SaxtonRawlsSoil::*member>
double saxton(Inputs& in, std::size_t i) {
    return answered(saxton_rawls_soil(shares(in, i), in.number("organic", i))).*member;
}

template <double SaxtonRawlsSoil::*member>
double saxton_percent(Inputs& in, std::size_t i) {
    return 100.0 * saxton<member>(in, i);
}

// --- Soil groups. ---

double soil_group_bound(Inputs& in, std::size_t i) {
    const SoilGroupRow& row = row_at(soil_group_rows(), in.number("row", i));
    switch (counted<SoilGroup>(in, "group", i)) {
        case SoilGroup::A:
            return row.above_for_A_mm_per_h;
        case SoilGroup::B:
            return row.above_for_B_mm_per_h;
        case SoilGroup::C:
            return row.above_for_C_mm_per_h;
        case SoilGroup::D:
            break;
    }
    throw std::runtime_error("group D has no bound");
}

SoilGroupRating rating(Inputs& in, std::size_t i) {
    SoilProfile profile{in.quantity("conductivity", rate, i)};
    if (in.has("impermeable_depth"))
        profile.impermeable_depth_mm = in.quantity("impermeable_depth", depth, i);
    if (in.has("water_table_depth"))
        profile.water_table_depth_mm = in.quantity("water_table_depth", depth, i);
    return answered(rated_soil(profile)).rating;
}

double rated_group_drained(Inputs& in, std::size_t i) {
    return count_of(rating(in, i).drained);
}

double rated_group_undrained(Inputs& in, std::size_t i) {
    return count_of(rating(in, i).undrained);
}

using GA = GreenAmptTexture;
using RB = RawlsBrakensiekSoil;
using SR = SaxtonRawlsSoil;
using SW = SoilWaterTexture;

constexpr std::array kSoilOperations{
    Operation{"green_ampt_porosity", {}, green_ampt_value<&GA::porosity>},
    Operation{"green_ampt_porosity_low", {}, green_ampt_low<&GA::porosity>},
    Operation{"green_ampt_porosity_high", {}, green_ampt_high<&GA::porosity>},
    Operation{"green_ampt_porosity_middle", {}, green_ampt_middle<&GA::porosity>},
    Operation{"green_ampt_corrected_porosity_middle", {}, corrected_porosity_middle},
    Operation{"green_ampt_effective_porosity", {}, green_ampt_value<&GA::effective_porosity>},
    Operation{"green_ampt_effective_porosity_low", {}, green_ampt_low<&GA::effective_porosity>},
    Operation{"green_ampt_effective_porosity_high", {}, green_ampt_high<&GA::effective_porosity>},
    Operation{
        "green_ampt_effective_porosity_middle", {}, green_ampt_middle<&GA::effective_porosity>},
    Operation{
        "green_ampt_corrected_effective_porosity", {}, corrected<&GA::effective_porosity_fault>},
    Operation{"green_ampt_suction", suction, green_ampt_value<&GA::suction_mm>},
    Operation{"green_ampt_suction_low", suction, green_ampt_low<&GA::suction_mm>},
    Operation{"green_ampt_suction_high", suction, green_ampt_high<&GA::suction_mm>},
    Operation{"green_ampt_suction_middle", suction, green_ampt_suction_middle},
    Operation{"green_ampt_table_conductivity", rate, green_ampt_value<&GA::conductivity_mm_per_h>},
    Operation{"green_ampt_corrected_conductivity", rate, corrected<&GA::conductivity_fault>},
    Operation{"soil_water_conductivity", rate,
              soil_water_value<&SW::saturated_conductivity_mm_per_h>},
    Operation{"soil_water_half_conductivity", rate, soil_water_half_conductivity},
    Operation{"soil_water_field_capacity", {}, soil_water_value<&SW::field_capacity>},
    Operation{"soil_water_wilting_point", {}, soil_water_value<&SW::wilting_point>},
    Operation{"texture_number", {}, texture_number},
    Operation{"soil_group_by_texture", {}, soil_group_by_texture},
    Operation{"regressed_suction", suction, regressed<&RB::suction_mm>},
    Operation{"regressed_suction_by_brooks_corey", suction,
              regressed<&RB::suction_by_brooks_corey_mm>},
    Operation{"regressed_conductivity", rate, regressed<&RB::saturated_conductivity_mm_per_h>},
    Operation{"saxton_wilting_point_percent", {}, saxton_percent<&SR::wilting_point>},
    Operation{"saxton_field_capacity_percent", {}, saxton_percent<&SR::field_capacity>},
    Operation{"saxton_saturation_percent", {}, saxton_percent<&SR::saturation>},
    Operation{"saxton_available_water_percent", {}, saxton_percent<&SR::available_water>},
    Operation{"saxton_conductivity", rate, saxton<&SR::saturated_conductivity_mm_per_h>},
    Operation{"saxton_density", {}, saxton<&SR::density_g_per_cm3>},
    Operation{"soil_group_bound", rate, soil_group_bound},
    Operation{"rated_group_drained", {}, rated_group_drained},
    Operation{"rated_group_undrained", {}, rated_group_undrained},
};

}  // namespace

std::span<const Operation> soil_operations() {
    return kSoilOperations;
}

}  // namespace rainledger::published
