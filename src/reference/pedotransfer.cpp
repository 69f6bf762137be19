#include "rainledger/reference/pedotransfer.hpp"

#include <cmath>
#include <string_view>

#include "rainledger/base/number.hpp"
#include "reference/printed_units.hpp"
#include "reference/sources.hpp"

// Symbols follow the sources: S sand and C clay (percent in Rawls and Brakensiek, fractions in
// Saxton and Rawls), p porosity, OM organic matter (percent by weight). Coefficients from memory;
// those of 2006 return all twelve rows of the paper's table 3.
namespace rainledger {
namespace {

using printed::kMmPerCm;

void add_caution(std::string& caution, const std::string& words) {
    if (!caution.empty()) caution += "; ";
    caution += words;
}

// --- Rawls and Brakensiek (1985). ---

/// Sand and clay in percent, porosity as a fraction, and the products that the regressions share.
struct Terms {
    double S, C, p;
    double S2, C2, p2;
};

double suction_cm(const Terms& t) {
    return std::exp(6.531 - 7.326 * t.p + 0.00158 * t.C2 + 3.809 * t.p2 + 0.000344 * t.S * t.C -
                    0.04989 * t.S * t.p + 0.0016 * t.S2 * t.p2 + 0.0016 * t.C2 * t.p2 -
                    0.0000136 * t.S2 * t.C - 0.00348 * t.C2 * t.p - 0.000799 * t.S2 * t.p);
}

double saturated_conductivity_cm_per_h(const Terms& t) {
    return std::exp(19.52348 * t.p - 8.96847 - 0.028212 * t.C + 0.00018107 * t.S2 -
                    0.0094125 * t.C2 - 8.395215 * t.p2 + 0.077718 * t.S * t.p -
                    0.00298 * t.S2 * t.p2 - 0.019492 * t.C2 * t.p2 + 0.0000173 * t.S2 * t.C +
                    0.02733 * t.C2 * t.p + 0.001434 * t.S2 * t.p - 0.0000035 * t.C2 * t.S);
}

double bubbling_pressure_cm(const Terms& t) {
    return std::exp(5.3396738 + 0.1845038 * t.C - 2.48394546 * t.p - 0.00213853 * t.C2 -
                    0.04356349 * t.S * t.p - 0.61745089 * t.C * t.p + 0.00143598 * t.S2 * t.p2 -
                    0.00855375 * t.C2 * t.p2 - 0.00001282 * t.S2 * t.C + 0.00895359 * t.C2 * t.p -
                    0.00072472 * t.S2 * t.p + 0.0000054 * t.C2 * t.S + 0.50028060 * t.p2 * t.C);
}

double pore_index(const Terms& t) {
    return std::exp(-0.7842831 + 0.0177544 * t.S - 1.062498 * t.p - 0.00005304 * t.S2 -
                    0.00273493 * t.C2 + 1.11134946 * t.p2 - 0.03088295 * t.S * t.p +
                    0.00026587 * t.S2 * t.p2 - 0.00610522 * t.C2 * t.p2 - 0.00000235 * t.S2 * t.C +
                    0.00798746 * t.C2 * t.p - 0.00674491 * t.p2 * t.C);
}

double residual_content(const Terms& t) {
    return -0.0182482 + 0.00087269 * t.S + 0.00513488 * t.C + 0.02939286 * t.p - 0.00015395 * t.C2 -
           0.0010827 * t.S * t.p - 0.00018233 * t.C2 * t.p2 + 0.00030703 * t.C2 * t.p -
           0.0023584 * t.p2 * t.C;
}

/// Brooks and Corey's lambda and hb to the suction of a wetting front.
double suction_by_brooks_corey(double lambda, double bubbling_pressure) {
    return (2.0 + 3.0 * lambda) / (1.0 + 3.0 * lambda) * bubbling_pressure / 2.0;
}

std::string outside_rawls_brakensiek(const ParticleShares& shares) {
    std::string caution;
    if (shares.sand_percent <= 5.0 || shares.sand_percent >= 70.0)
        add_caution(caution, "sand of " + shortest(shares.sand_percent) +
                                 " % lies outside 5 to 70 %: an extrapolation");
    if (shares.clay_percent <= 5.0 || shares.clay_percent >= 60.0)
        add_caution(caution, "clay of " + shortest(shares.clay_percent) +
                                 " % lies outside 5 to 60 %: an extrapolation");
    return caution;
}

// --- Saxton and Rawls (2006). ---

/// Sand and clay as fractions, organic matter in percent.
struct Mix {
    double S, C, OM;
};

double content_at_1500_kpa(const Mix& m) {
    const double t = -0.024 * m.S + 0.487 * m.C + 0.006 * m.OM + 0.005 * m.S * m.OM -
                     0.013 * m.C * m.OM + 0.068 * m.S * m.C + 0.031;
    return t + (0.14 * t - 0.02);
}

double content_at_33_kpa(const Mix& m) {
    const double t = -0.251 * m.S + 0.195 * m.C + 0.011 * m.OM + 0.006 * m.S * m.OM -
                     0.027 * m.C * m.OM + 0.452 * m.S * m.C + 0.299;
    return t + (1.283 * t * t - 0.374 * t - 0.015);
}

/// The water between saturation and 33 kPa.
double content_above_33_kpa(const Mix& m) {
    const double t = 0.278 * m.S + 0.034 * m.C + 0.022 * m.OM - 0.018 * m.S * m.OM -
                     0.027 * m.C * m.OM - 0.584 * m.S * m.C + 0.078;
    return t + (0.636 * t - 0.107);
}

double air_entry_kpa(const Mix& m, double above_33) {
    const double t = -21.67 * m.S - 27.93 * m.C - 81.97 * above_33 + 71.12 * m.S * above_33 +
                     8.29 * m.C * above_33 + 14.05 * m.S * m.C + 27.16;
    return t + (0.02 * t * t - 0.113 * t - 0.70);
}

constexpr double kParticleDensity = 2.65;  // g/cm3
constexpr double kKpaPerMetreOfWater = 9.80665;
constexpr double kMmPerMetre = 1000.0;
constexpr double kWettestKpa = 33.0;
constexpr double kDriestKpa = 1500.0;

SaxtonRawlsSoil saxton_rawls(const Mix& m) {
    SaxtonRawlsSoil soil;
    const double above_33 = content_above_33_kpa(m);
    soil.wilting_point = content_at_1500_kpa(m);
    soil.field_capacity = content_at_33_kpa(m);
    soil.saturation = soil.field_capacity + above_33 - 0.097 * m.S + 0.043;
    soil.available_water = soil.field_capacity - soil.wilting_point;
    soil.density_g_per_cm3 = kParticleDensity * (1.0 - soil.saturation);
    const double air_entry = air_entry_kpa(m, above_33);
    if (air_entry >= 0.0) soil.air_entry_mm = air_entry / kKpaPerMetreOfWater * kMmPerMetre;
    const double drying = std::log(soil.field_capacity) - std::log(soil.wilting_point);
    soil.pore_index = drying / (std::log(kDriestKpa) - std::log(kWettestKpa));
    soil.saturated_conductivity_mm_per_h =
        1930.0 * std::pow(soil.saturation - soil.field_capacity, 3.0 - soil.pore_index);
    return soil;
}

bool rises(const SaxtonRawlsSoil& soil) {
    return soil.wilting_point > 0.0 && soil.field_capacity > soil.wilting_point &&
           soil.saturation > soil.field_capacity && soil.saturation < 1.0;
}

std::string outside_saxton_rawls(const ParticleShares& shares, double organic_percent,
                                 const SaxtonRawlsSoil& soil) {
    std::string caution;
    if (shares.clay_percent > 60.0)
        add_caution(caution, "clay of " + shortest(shares.clay_percent) +
                                 " % lies above 60 %: an extrapolation");
    if (organic_percent > 8.0)
        add_caution(caution, "organic matter of " + shortest(organic_percent) +
                                 " % lies above 8 %: an extrapolation");
    if (!soil.air_entry_mm)
        add_caution(caution, "the equation for air entry gives less than 0 and is left out");
    return caution;
}

ValueView plain(std::string_view key, std::string_view label, double figure) {
    return {key, label, {}, "", printed::value(figure)};
}

ValueView head(std::string_view key, std::string_view label, double figure_mm,
               std::string_view unit) {
    return {key, label, Dimension::suction, unit, printed::value(figure_mm)};
}

ValueView rate(std::string_view key, std::string_view label, double figure_mm_per_h,
               std::string_view unit) {
    return {key, label, Dimension::rate, unit, printed::value(figure_mm_per_h)};
}

}  // namespace

Answer<RawlsBrakensiekSoil> rawls_brakensiek_soil(const ParticleShares& shares, double porosity) {
    std::string problem = shares_problem(shares);
    if (problem.empty() && !(porosity > 0.0 && porosity < 1.0))
        problem = "porosity must lie between 0 and 1";
    if (!problem.empty()) return refusal<RawlsBrakensiekSoil>(std::move(problem));
    const double S = shares.sand_percent;
    const double C = shares.clay_percent;
    const Terms terms{S, C, porosity, S * S, C * C, porosity * porosity};
    RawlsBrakensiekSoil soil;
    soil.suction_mm = suction_cm(terms) * kMmPerCm;
    soil.saturated_conductivity_mm_per_h = saturated_conductivity_cm_per_h(terms) * kMmPerCm;
    soil.bubbling_pressure_mm = bubbling_pressure_cm(terms) * kMmPerCm;
    soil.pore_index = pore_index(terms);
    soil.residual_content = residual_content(terms);
    soil.suction_by_brooks_corey_mm =
        suction_by_brooks_corey(soil.pore_index, soil.bubbling_pressure_mm);
    soil.caution = outside_rawls_brakensiek(shares);
    return {std::move(soil), {}, {}};
}

Answer<SaxtonRawlsSoil> saxton_rawls_soil(const ParticleShares& shares, double organic_percent) {
    std::string problem = shares_problem(shares);
    if (problem.empty() && !(organic_percent >= 0.0 && organic_percent <= 100.0))
        problem = "organic matter must lie between 0 and 100 %";
    if (!problem.empty()) return refusal<SaxtonRawlsSoil>(std::move(problem));
    SaxtonRawlsSoil soil =
        saxton_rawls({shares.sand_percent / 100.0, shares.clay_percent / 100.0, organic_percent});
    if (!rises(soil))
        return refusal<SaxtonRawlsSoil>(
            "the equations of Saxton and Rawls give no soil here: water contents do not rise from "
            "1500 kPa to saturation",
            "clean sand without clay and organic matter, and heavy clay with much of it, lie "
            "beyond them");
    soil.caution = outside_saxton_rawls(shares, organic_percent, soil);
    return {std::move(soil), {}, {}};
}

const Provenance& rawls_brakensiek_provenance() {
    static constexpr Provenance kProvenance{&sources::kRawlsBrakensiek1985,
                                            "regressions on sand, clay and porosity",
                                            Status::from_memory};
    return kProvenance;
}

const Provenance& saxton_rawls_provenance() {
    static constexpr Provenance kProvenance{
        &sources::kSaxtonRawls2006, "equations 1 to 6, 15, 16 and 18", Status::from_memory,
        "they return all twelve rows of table 3, which does not hold the air entry"};
    return kProvenance;
}

RowView view_of(const RawlsBrakensiekSoil& soil) {
    return {"Rawls and Brakensiek (1985)",
            {head("wetting_front_suction_mm", "wetting-front suction", soil.suction_mm, "cm"),
             head("wetting_front_suction_by_brooks_corey_mm",
                  "wetting-front suction by bubbling pressure and pore index",
                  soil.suction_by_brooks_corey_mm, "cm"),
             rate("saturated_conductivity_mm_per_h", "saturated conductivity",
                  soil.saturated_conductivity_mm_per_h, "cm/h"),
             head("bubbling_pressure_mm", "bubbling pressure", soil.bubbling_pressure_mm, "cm"),
             plain("pore_index", "pore size index", soil.pore_index),
             plain("residual_content", "residual water", soil.residual_content)},
            {},
            rawls_brakensiek_provenance()};
}

RowView view_of(const SaxtonRawlsSoil& soil) {
    return {"Saxton and Rawls (2006)",
            {plain("wilting_point", "water at 1500 kPa", soil.wilting_point),
             plain("field_capacity", "water at 33 kPa", soil.field_capacity),
             plain("saturation", "water at saturation", soil.saturation),
             plain("available_water", "available to plants", soil.available_water),
             {"air_entry_mm",
              "tension at air entry",
              Dimension::suction,
              "kPa",
              {soil.air_entry_mm, {}}},
             plain("pore_index", "pore size index", soil.pore_index),
             rate("saturated_conductivity_mm_per_h", "saturated conductivity",
                  soil.saturated_conductivity_mm_per_h, "mm/h"),
             plain("density_g_per_cm3", "dry density, g/cm3", soil.density_g_per_cm3)},
            {},
            saxton_rawls_provenance()};
}

}  // namespace rainledger
