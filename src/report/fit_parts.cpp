#include "report/fit_parts.hpp"

#include <algorithm>
#include <array>
#include <cmath>

#include "rainledger/base/number.hpp"

namespace rainledger {
namespace {

constexpr std::array kParameters{
    ParameterWords{"initial_capacity_mm_per_h", "initial capacity", Dimension::rate,
                   "initial_capacity", "mm/h"},
    ParameterWords{"final_capacity_mm_per_h", "final capacity", Dimension::rate, "final_capacity",
                   "mm/h"},
    ParameterWords{"decay_per_h", "decay", Dimension::decay, "decay", "1/h"},
    ParameterWords{"effective_conductivity_mm_per_h", "effective conductivity", Dimension::rate,
                   "effective_conductivity", "mm/h"},
    ParameterWords{"suction_deficit_mm", "suction-deficit product", Dimension::depth,
                   "suction_deficit", "mm"},
    ParameterWords{"sorptivity_mm_per_sqrt_h", "sorptivity", Dimension::sorptivity, "sorptivity",
                   "mm/h^0.5"},
    ParameterWords{"steady_term_mm_per_h", "steady term", Dimension::rate, "steady_term", "mm/h"},
    ParameterWords{"coefficient_mm", "depth at 1 h", Dimension::depth, ""},
    ParameterWords{"exponent", "exponent", std::nullopt, ""},
};

std::string unit_of(Dimension dimension, const Display& display) {
    if (dimension == Dimension::decay) return "1/h";
    const std::string depth(display.depth_unit());
    if (dimension == Dimension::sorptivity) return depth + "/h^0.5";
    return dimension == Dimension::rate ? std::string(display.rate_unit()) : depth;
}

void append_sentences(std::vector<std::string>& out, const std::string& lead,
                      const std::vector<FitWarning>& warnings) {
    for (const FitWarning& warning : warnings)
        out.push_back(lead + warning.text);
}

}  // namespace

const ParameterWords& parameter_words(std::string_view key) {
    return *std::ranges::find(kParameters, key, &ParameterWords::key);
}

std::string parameter_label(std::string_view key, const Display& display) {
    const ParameterWords& words = parameter_words(key);
    std::string label(words.words);
    return words.dimension ? label + " (" + unit_of(*words.dimension, display) + ")" : label;
}

std::string parameter_number(std::string_view key, double value, const Display& display) {
    constexpr double kLeast = 0.01;  // below it three figures take more than four decimals
    constexpr int kMostDecimals = 4;
    if (std::isinf(value)) return "unlimited";
    const auto dimension = parameter_words(key).dimension;
    const double shown =
        dimension ? find_unit(unit_of(*dimension, display), *dimension)->from_canonical(value)
                  : value;
    if (shown != 0.0 && std::abs(shown) < kLeast) return fixed(shown, kMostDecimals);
    return three_figures(shown);
}

std::string_view pit_key(const InfiltrationTest& test) {
    return test.pit.empty() ? std::string_view("pit") : std::string_view(test.pit);
}

std::string_view steady_convention_key(SteadyConvention convention) {
    constexpr std::array<std::string_view, kSteadyConventions.size()> kKeys{
        "last_three_within_tenth", "less_than_tenth_in_an_hour"};
    return kKeys[static_cast<std::size_t>(convention)];
}

RankedFits site_fits(const FieldFit& fit) {
    if (fit.pooled) return {fit.pooled->laws, fit.pooled->ranking};
    return {fit.pits.front().laws, fit.pits.front().ranking};
}

std::size_t reading_count(const FieldFit& fit) {
    std::size_t count = 0;
    for (const TestFit& pit : fit.pits)
        count += pit.test.readings.size();
    return count;
}

std::string best_alone_words(const FieldFit& fit) {
    std::string out;
    for (const FieldLaw law : fit.options.laws) {
        const auto count = std::ranges::count_if(fit.pits, [law](const TestFit& pit) {
            return !pit.ranking.empty() && pit.ranking.front().law == law;
        });
        if (count > 0)
            out += (out.empty() ? "" : ", ") + std::string(field_law_name(law)) + " in " +
                   std::to_string(count) + " of " + std::to_string(fit.pits.size());
    }
    return out;
}

std::vector<FitWarning> ranked_warnings(const RankedFits& fits) {
    std::vector<FitWarning> out;
    for (const RankedLaw& ranked : fits.ranking) {
        const auto& warnings = fits.laws[ranked.index].fit->warnings;
        out.insert(out.end(), warnings.begin(), warnings.end());
    }
    return out;
}

std::vector<std::string> all_fit_warnings(const FieldFit& fit) {
    std::vector<std::string> out;
    for (const TestFit& pit : fit.pits) {
        const std::string lead = fit.pits.size() > 1 ? "pit " + pit.test.pit + ": " : std::string();
        append_sentences(out, lead, pit.warnings);
        append_sentences(out, lead, ranked_warnings({pit.laws, pit.ranking}));
    }
    if (!fit.pooled) return out;
    append_sentences(out, "all pits: ", fit.pooled->warnings);
    append_sentences(out, "all pits: ", ranked_warnings(site_fits(fit)));
    return out;
}

}  // namespace rainledger
