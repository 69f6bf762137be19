#include <string>

#include "scenario/losses_reader.hpp"
#include "scenario/shown.hpp"

// The runoff curve number: its number, ratio and antecedent condition.
namespace rainledger {
namespace {

constexpr double kLowNumber = 40.0;
constexpr double kConvertedRatio = 0.05;
constexpr double kTabulatedRatio = 0.2;

std::optional<double> read_number(const ClosedMap& map) {
    const std::string hint = "write a plain number above 0 and up to 100, such as 89";
    const Entry* entry = map.require("number", "89");
    if (entry == nullptr) return std::nullopt;
    const auto number = read_bare(map.reading(), *entry, hint);
    if (!number) return std::nullopt;
    if (!(*number > 0.0 && *number <= 100.0)) {
        map.reading().error(entry->mark(),
                            "number: '" + map.shown("number") + "' is not above 0 and up to 100",
                            hint);
        return std::nullopt;
    }
    return number;
}

/// The number that is computed with, after its antecedent condition, may be too low to trust.
void warn_low_number(const ClosedMap& map, const CurveNumber& given) {
    const double used = converted_number(given);
    if (!(used < kLowNumber)) return;
    std::string number = "a curve number of " + map.shown("number");
    if (used != given.number)
        number += ", " + brief(used) + " for antecedent condition " + map.shown("antecedent");
    map.reading().warning(map.mark_of("number"), number + ", under 40",
                          "the method answers poorly there: look for measured losses instead");
}

void check_ratios(const ClosedMap& map, double ratio, const std::optional<double>& tabulated) {
    const Reading& reading = map.reading();
    if (!map.has("tabulated_ratio")) {
        if (ratio == kConvertedRatio)
            reading.warning(
                map.mark_of("initial_abstraction_ratio"),
                "a ratio of 0.05 without the ratio that the number was tabulated for",
                "published tables are for 0.2: add 'tabulated_ratio: 0.2' to convert the "
                "number, or 'tabulated_ratio: 0.05' to say that it needs none");
        return;
    }
    if (!tabulated || *tabulated == ratio) return;
    if (*tabulated != kTabulatedRatio)
        reading.error(
            map.mark_of("tabulated_ratio"),
            "no conversion is published from a tabulated ratio of " + map.shown("tabulated_ratio"),
            "it is 0.2, or the initial_abstraction_ratio itself for no conversion");
    else if (ratio != kConvertedRatio)
        reading.error(map.mark_of("tabulated_ratio"),
                      "the conversion from a tabulated ratio of 0.2 is published for an "
                      "initial_abstraction_ratio of 0.05 alone",
                      "write 'initial_abstraction_ratio: 0.05', or leave tabulated_ratio out");
}

AntecedentCondition read_antecedent(const ClosedMap& map) {
    const auto word = map.word("antecedent", kConditions);
    if (!word) return AntecedentCondition::II;
    const auto condition = static_cast<AntecedentCondition>(*word);
    if (condition == AntecedentCondition::I)
        map.reading().warning(map.mark_of("antecedent"),
                              "a dry start: antecedent condition I lowers the number",
                              "designs start at II unless a dry start can be shown");
    return condition;
}

/// Whether the retention that follows can be computed with.
bool retention_is_usable(const ClosedMap& map, const CurveNumber& given) {
    // Checked before the conversions too, which a tiny number could take to infinity.
    if (retention_mm(given.number) <= kLargestValue &&
        retention_curve(given).retention_mm <= kLargestValue)
        return true;
    map.reading().error(map.mark_of("number"),
                        "number: '" + map.shown("number") +
                            "' is too small to compute with: its retention is beyond 1e12 mm",
                        "curve numbers stand between 30 and 100");
    return false;
}

}  // namespace

std::optional<Losses> read_curve_number(const ClosedMap& map) {
    const auto number = read_number(map);
    const auto given_ratio = map.fraction("initial_abstraction_ratio");
    const auto tabulated = map.fraction("tabulated_ratio");
    const bool ratio_wrong = map.has("initial_abstraction_ratio") && !given_ratio;
    const AntecedentCondition antecedent = read_antecedent(map);
    const double ratio = given_ratio.value_or(kTabulatedRatio);
    if (!ratio_wrong) check_ratios(map, ratio, tabulated);
    if (!number) return std::nullopt;
    const CurveNumber given{*number, ratio, tabulated, antecedent};
    warn_low_number(map, given);
    if (!retention_is_usable(map, given)) return std::nullopt;
    return given;
}

}  // namespace rainledger
