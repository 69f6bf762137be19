#include "report/rain_words.hpp"

#include <cstddef>

#include "rainledger/base/number.hpp"
#include "report/display.hpp"

namespace rainledger {
namespace {

struct PatternNames {
    std::string_view key;
    std::string_view words;
};

constexpr PatternNames kUniform{"uniform", "uniform"};
constexpr PatternNames kTriangular{"triangular", "triangular"};
constexpr PatternNames kBlocks{"alternating_blocks", "alternating blocks"};
constexpr PatternNames kKeiferChu{"keifer_chu", "Keifer and Chu"};
constexpr PatternNames kMassCurve{"mass_curve", "mass curve"};

const PatternNames& names_of(StormPattern pattern) {
    switch (pattern) {
        case StormPattern::uniform:
            return kUniform;
        case StormPattern::triangular:
            return kTriangular;
        case StormPattern::alternating_blocks:
            return kBlocks;
        case StormPattern::keifer_chu:
            return kKeiferChu;
        case StormPattern::mass_curve:
            break;
    }
    return kMassCurve;
}

/// Return periods found in a table are no surer than this.
std::string estimated_years(double years) {
    constexpr double kWholeFrom = 9.95;
    std::string text = fixed(years, years < kWholeFrom ? 1 : 0);
    if (text.ends_with(".0")) text.resize(text.size() - 2);
    return text;
}

}  // namespace

std::string_view pattern_words(StormPattern pattern) {
    return names_of(pattern).words;
}

std::string_view pattern_key(StormPattern pattern) {
    return names_of(pattern).key;
}

std::string years_text(double years) {
    return four_figures(years) + " yr";
}

bool is_common(const Rarity& rarity) {
    return !rarity.years && !rarity.more_than && rarity.less_than;
}

std::string rarity_words(const Rarity& rarity) {
    if (rarity.years) return "about " + estimated_years(*rarity.years) + " yr";
    if (rarity.more_than && rarity.less_than)
        return "between " + years_text(*rarity.more_than) + " and " + years_text(*rarity.less_than);
    if (rarity.more_than) return "more than " + years_text(*rarity.more_than);
    if (rarity.less_than) return "less than " + years_text(*rarity.less_than);
    return "-";
}

std::string rarity_cell(const Rarity& rarity) {
    if (rarity.years) return estimated_years(*rarity.years);
    if (rarity.more_than && rarity.less_than)
        return four_figures(*rarity.more_than) + "-" + four_figures(*rarity.less_than);
    if (rarity.more_than) return ">" + four_figures(*rarity.more_than);
    if (rarity.less_than) return "<" + four_figures(*rarity.less_than);
    return "-";
}

double heaviest_step_h(const Hyetograph& rain) {
    std::size_t heaviest = 0;
    for (std::size_t step = 1; step < rain.own_steps; ++step)
        if (rain.intensity_mm_per_h(step) > rain.intensity_mm_per_h(heaviest)) heaviest = step;
    return rain.duration_h[heaviest];
}

}  // namespace rainledger
