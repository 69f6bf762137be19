#include "scenario/words.hpp"

#include <algorithm>
#include <utility>

#include "rainledger/base/suggest.hpp"

namespace rainledger {
namespace {

/// The place in a field test that an unknown word in its map of `known` keys belongs to.
std::optional<std::string> place_in_field_test(std::string_view typed, Words known) {
    const bool top = holds(known, "readings");
    if (!top && !holds(known, kRingKeys.front()) && !holds(known, kSteadyRateKeys.front()))
        return std::nullopt;
    if (!top && holds(kFieldTestKeys, typed))
        return "it belongs to the top level of the field test";
    if (holds(kRingKeys, typed)) return "it belongs under 'ring'";
    if (holds(kSteadyRateKeys, typed)) return "it belongs under 'steady_rate'";
    return suggestion(typed, known);
}

}  // namespace

bool holds(Words words, std::string_view word) {
    return std::ranges::find(words, word) != words.end();
}

std::optional<std::string_view> probably_meant(std::string_view typed, Words known) {
    if (const auto here = synonym(typed, known)) return here;
    return nearest(typed, known);
}

std::string way_out(std::string_view typed, Words known) {
    if (const auto here = synonym(typed, known))
        return "here it is called '" + std::string(*here) + "'";
    if (auto place = place_in_field_test(typed, known)) return *std::move(place);
    if (typed == "losses") return "it belongs to a surface";
    if (typed == "draws") return "it is for what-if runs, not for losses: leave it out";
    if (holds(kLaws, typed) && holds(known, "losses")) return "it belongs under 'losses'";
    if (holds(kSurfaceKeys, typed)) return "it belongs to a surface, beside its 'losses'";
    if (holds(kScenarioKeys, typed)) return "it belongs to the top level of the scenario";
    if (holds(known, "record")) {
        if (holds(kDesignKeys, typed) && !holds(kStepsKeys, typed))
            return "it belongs under 'design'";
        if (holds(kRecordKeys, typed) && !holds(kHyetographKeys, typed))
            return "it belongs under 'record'";
    }
    if (typed == "event" && holds(known, "at_least"))
        return "all events are taken here; 'record' in a storm takes one";
    if (typed == "gaps" && holds(known, "dry_spell"))
        return "holes in a record are always taken as dry: take it out";
    if (typed == "at_least" && holds(known, "event")) return "it belongs under 'from_record'";
    if (typed == kFromRecord) return "it stands alone under 'storms'";
    if (holds(kStormKeys, typed) && holds(known, "storm")) return "it belongs under 'storm'";
    if (holds(kStormKeys, typed) && !holds(kRainForms, typed)) return "it belongs to the storm";
    return suggestion(typed, known);
}

}  // namespace rainledger
