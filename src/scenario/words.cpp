#include "scenario/words.hpp"

#include <algorithm>

#include "rainledger/base/suggest.hpp"

namespace rainledger {
namespace {

struct Synonym {
    std::string_view typed;  ///< lower case, '_' between words
    std::string_view here;
};

/// Common practice: the words of textbooks and soil surveys. One word may stand for several keys;
/// the map it is found in decides.
constexpr auto kSynonyms = std::to_array<Synonym>({
    {"name", "title"},
    {"description", "title"},
    {"catchments", "surfaces"},
    {"catchment", "surfaces"},
    {"areas", "surfaces"},
    {"event", "storm"},
    {"events", "storms"},
    {"rainfall", "storm"},
    {"rain", "storm"},
    {"precipitation", "storm"},
    {"rain", "hyetograph"},
    {"rainfall", "hyetograph"},
    {"precipitation", "hyetograph"},
    {"gauge", "hyetograph"},
    {"series", "hyetograph"},
    {"time_series", "hyetograph"},
    {"csv", "hyetograph"},
    {"file", "hyetograph"},
    {"path", "file"},
    {"csv", "file"},
    {"hyetograph", "file"},
    {"factor", "multiply_by"},
    {"climate_factor", "multiply_by"},
    {"allowance", "multiply_by"},
    {"scale", "multiply_by"},
    {"dry_time", "continue_for"},
    {"tail", "continue_for"},
    {"column", "rain"},
    {"rainfall", "rain"},
    {"precipitation", "rain"},
    {"timezone", "zone"},
    {"time_zone", "zone"},
    {"tz", "zone"},
    {"units", "unit"},
    {"missing_value", "missing"},
    {"nodata", "missing"},
    {"no_data", "missing"},
    {"step", "every"},
    {"dt", "every"},
    {"interval", "every"},
    {"time_step", "every"},
    {"timestep", "every"},
    {"depth", "depths"},
    {"rain", "depths"},
    {"intensity", "intensities"},
    {"times", "ends"},
    {"inlet", "drains_to"},
    {"outfall", "drains_to"},
    {"outlet", "drains_to"},
    {"manhole", "drains_to"},
    {"node", "drains_to"},
    {"depression", "depression_storage"},
    {"surface_storage", "depression_storage"},
    {"infiltration", "losses"},
    {"loss", "losses"},
    {"law", "losses"},
    {"method", "losses"},
    {"run_on", "runs_onto"},
    {"runon", "runs_onto"},
    {"route_to", "runs_onto"},
    {"paved", "impervious"},
    {"impermeable", "impervious"},
    {"scs", "curve_number"},
    {"nrcs", "curve_number"},
    {"cn", "curve_number"},
    {"cn", "number"},
    {"curve_number", "number"},
    {"phi", "phi_index"},
    {"w_index", "phi_index"},
    {"uniform_loss", "constant_rate"},
    {"f0", "initial_capacity"},
    {"fc", "final_capacity"},
    {"k", "decay"},
    {"alpha", "decay"},
    {"decay_constant", "decay"},
    {"ksat", "effective_conductivity"},
    {"ks", "effective_conductivity"},
    {"k", "effective_conductivity"},
    {"hydraulic_conductivity", "effective_conductivity"},
    {"conductivity", "effective_conductivity"},
    {"psi", "wetting_front_suction"},
    {"suction", "wetting_front_suction"},
    {"suction_head", "wetting_front_suction"},
    {"capillary_suction", "wetting_front_suction"},
    {"initial_deficit", "moisture_deficit"},
    {"deficit", "moisture_deficit"},
    {"soil_moisture_deficit", "moisture_deficit"},
    {"s", "sorptivity"},
    {"sp", "sorptivity"},
    {"a", "steady_term"},
    {"loss_rate", "rate"},
    {"constant_rate", "rate"},
    {"uniform_rate", "rate"},
    {"ia", "initial_loss"},
    {"initial_abstraction", "initial_loss"},
    {"excess", "observed_excess"},
    {"runoff", "observed_excess"},
    {"observed_runoff", "observed_excess"},
    {"ia_ratio", "initial_abstraction_ratio"},
    {"lambda", "initial_abstraction_ratio"},
    {"amc", "antecedent"},
    {"arc", "antecedent"},
    {"antecedent_condition", "antecedent"},
    {"antecedent_moisture", "antecedent"},
    {"1", "I"},
    {"2", "II"},
    {"3", "III"},
    {"dry", "I"},
    {"average", "II"},
    {"normal", "II"},
    {"wet", "III"},
});

bool holds(Words words, std::string_view word) {
    return std::ranges::find(words, word) != words.end();
}

std::string folded(std::string_view word) {
    std::string out(word);
    for (char& c : out) {
        if (c >= 'A' && c <= 'Z') c = static_cast<char>(c - 'A' + 'a');
        if (c == '-' || c == ' ') c = '_';
    }
    return out;
}

}  // namespace

std::optional<std::string_view> synonym(std::string_view typed, Words known) {
    const std::string from = folded(typed);
    for (const Synonym& candidate : kSynonyms)
        if (candidate.typed == from && holds(known, candidate.here)) return candidate.here;
    return std::nullopt;
}

std::optional<std::string_view> probably_meant(std::string_view typed, Words known) {
    if (const auto here = synonym(typed, known)) return here;
    return nearest(typed, known);
}

std::string way_out(std::string_view typed, Words known) {
    if (const auto here = synonym(typed, known))
        return "here it is called '" + std::string(*here) + "'";
    if (holds(kLaws, typed) && holds(known, "losses")) return "it belongs under 'losses'";
    if (holds(kSurfaceKeys, typed)) return "it belongs to a surface, beside its 'losses'";
    if (holds(kScenarioKeys, typed)) return "it belongs to the top level of the scenario";
    return suggestion(typed, known);
}

}  // namespace rainledger
