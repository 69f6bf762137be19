#include <algorithm>
#include <string>
#include <utility>

#include "rainledger/base/cut.hpp"
#include "rainledger/scenario/storm_making.hpp"
#include "scenario/depth_source_reader.hpp"
#include "scenario/mass_curve_reader.hpp"
#include "scenario/shown.hpp"
#include "scenario/storm_reader.hpp"

// Rain of a design storm.
namespace rainledger {
namespace {

constexpr const char* kDesignExample =
    "write 'design: {pattern: alternating_blocks, duration: 2 h, every: 5 min, return_period: 10 "
    "yr, statistics: county_rain.csv}'";
constexpr const char* kSourceExample =
    "add 'statistics: county_rain.csv' with 'return_period: 10 yr', or 'depth: 62 mm', or 'depths: "
    "{5 min: 9.8 mm, 1 h: 41 mm}', or 'formula: {a: 96.6 in/h, b: 13.9, m: 0.97, time: min}'";

std::optional<StormPattern> read_pattern(const ClosedMap& map) {
    const Entry* entry = map.require("pattern", "alternating_blocks");
    if (entry == nullptr) return std::nullopt;
    const std::string curve = entry->value.IsScalar() ? meant_curve(entry->value.Scalar()) : "";
    if (!curve.empty()) {
        map.reading().error(entry->mark(),
                            "pattern: " + in_quotes(entry->value.Scalar()) +
                                " is a curve of the pattern mass_curve",
                            "write 'pattern: mass_curve' with " + curve);
        return std::nullopt;
    }
    const auto word = read_word(map.reading(), *entry, kPatterns);
    if (!word) return std::nullopt;
    return static_cast<StormPattern>(*word);
}

std::optional<double> read_every(const ClosedMap& map) {
    const Entry* entry = map.require("every", "5 min");
    if (entry == nullptr) return std::nullopt;
    return read_step_length(map.reading(), *entry);
}

/// Keys that speak of another pattern than the storm's.
void refuse_keys_of_others(const ClosedMap& map, StormPattern pattern) {
    const auto refuse = [&](std::string_view key, const std::string& hint) {
        if (const Entry* entry = map.find(key))
            map.reading().error(entry->key_mark,
                                "'" + std::string(key) +
                                    "' does not go with 'pattern: " + map.shown("pattern") + "'",
                                hint);
    };
    if (!has_peak(pattern))
        refuse("peak_at", pattern == StormPattern::uniform
                              ? "rain that never changes has no peak: take it out"
                              : "the curve says where the peak is: take it out");
    if (pattern == StormPattern::mass_curve) return;
    refuse("curve", "take it out, or write 'pattern: mass_curve'");
    refuse("interpolate", "it says how a mass curve runs between its points: take it out");
}

/// Whether the pattern can be drawn from this source.
bool check_source(const ClosedMap& map, const Entry& source, StormPattern pattern) {
    if (pattern == StormPattern::alternating_blocks && source.key == "depth") {
        map.reading().error(source.key_mark,
                            "alternating_blocks needs the depths of many durations, not one depth",
                            "give 'statistics', 'depths' or 'formula'; a depth alone goes with "
                            "uniform, triangular or mass_curve");
        return false;
    }
    if (pattern == StormPattern::keifer_chu && source.key != "formula") {
        map.reading().error(source.key_mark,
                            "keifer_chu needs an intensity formula, not '" + source.key + "'",
                            "give 'formula: {a: 96.6 in/h, b: 13.9, m: 0.97, time: min}'; "
                            "'rainledger storm TABLE.csv --fit-formula' fits one to a table");
        return false;
    }
    return true;
}

/// Whether the table holds the return period; a return period beside another source is refused.
bool check_return_period(const ClosedMap& map, const Entry& source, const DesignWish& wish) {
    const Entry* stated = map.find("return_period");
    const auto* statistics = std::get_if<RainfallStatistics>(&wish.depth);
    if (statistics == nullptr) {
        if (stated == nullptr) return true;
        map.reading().error(
            stated->key_mark,
            "'return_period' picks a column of 'statistics'; it does not go with '" + source.key +
                "'",
            "take it out: a title can say how rare the storm is");
        return false;
    }
    if (stated != nullptr && !wish.return_period_yr) return false;  // wrong, and reported
    const ListAnswer answer = depths_of(*statistics, wish.return_period_yr);
    if (answer.list) return true;
    if (stated != nullptr || !map.is_misnamed("return_period"))
        map.reading().error(
            stated != nullptr ? stated->mark() : source.mark(), answer.problem,
            stated != nullptr ? answer.hint : "with 'return_period' " + answer.hint);
    return false;
}

/// The key to which a storm that cannot be made is owed, for this problem: the step where any storm
/// has it; else the formula; of a list, the duration where a storm of one step has it, or the step.
std::string_view blamed_key(const DesignWish& wish, const std::string& problem) {
    DesignWish plain;
    plain.pattern = StormPattern::uniform;
    plain.duration_h = wish.duration_h;
    plain.every_h = wish.every_h;
    plain.depth = 1.0;
    if (storm_of_design(plain).problem == problem) return "every";
    const auto* curve = std::get_if<DepthDuration>(&wish.depth);
    if (curve != nullptr && std::holds_alternative<IntensityFormula>(*curve)) return "formula";
    plain.every_h = wish.duration_h;
    plain.depth = wish.depth;
    plain.return_period_yr = wish.return_period_yr;
    return storm_of_design(plain).problem == problem ? "duration" : "every";
}

/// "24 h", "up to 6 h", "over 24 h", "6.1 h to 12 h".
std::string made_for(const MassCurveEntry& curve) {
    if (curve.shortest_h == curve.longest_h) return brief_time(curve.longest_h);
    if (!(curve.longest_h <= kLargestValue)) return "over " + brief_time(curve.shortest_h);
    if (!(curve.shortest_h > 0.0)) return "up to " + brief_time(curve.longest_h);
    return brief_time(curve.shortest_h) + " to " + brief_time(curve.longest_h);
}

void warn_curve_duration(const ClosedMap& map, const MassCurveEntry& curve, double duration_h) {
    if (duration_h >= curve.shortest_h && duration_h <= curve.longest_h) return;
    map.reading().warning(
        map.mark_of("duration"),
        "the curve " + std::string(curve.name) + " was made for storms of " + made_for(curve) +
            ", not " + brief_time(duration_h),
        "shortened or stretched it keeps its shares, not the intensities that it was "
        "drawn from: take a duration that it was made for, or another pattern");
}

/// The curve of the pattern mass_curve; false where it is wrong.
bool read_curve(const ClosedMap& map, DesignWish& wish) {
    auto read = read_mass_curve(map);
    if (!read) return false;
    wish.curve = std::move(read->curve);
    wish.curve_words = std::move(read->words);
    if (read->entry != nullptr && wish.duration_h > 0.0)
        warn_curve_duration(map, *read->entry, wish.duration_h);
    return true;
}

/// What the design asks for, as far as it is right; nothing else.
std::optional<DesignWish> read_wish(const ClosedMap& map, Storm& storm) {
    DesignWish wish;
    const auto pattern = read_pattern(map);
    const auto duration = map.required_quantity("duration", Dimension::time, Least::above_zero);
    const auto every = read_every(map);
    wish.peak_at = map.fraction("peak_at");
    wish.return_period_yr = map.quantity("return_period", Dimension::frequency, Least::above_zero);
    wish.duration_h = duration.value_or(0.0);
    bool sound = pattern && duration && every && wish.peak_at.has_value() == map.has("peak_at");
    if (pattern) refuse_keys_of_others(map, *pattern);
    if (pattern == StormPattern::mass_curve) sound = read_curve(map, wish) && sound;
    const Entry* entry =
        map.exactly_one(kDepthSources, "design has no depth of rain", kSourceExample,
                        "keep the one that the storm is to follow");
    if (entry == nullptr) return std::nullopt;
    if (pattern) sound = check_source(map, *entry, *pattern) && sound;
    auto source = read_depth_source(map.reading(), *entry, storm);
    if (!source) return std::nullopt;
    wish.depth = std::move(source->depth);
    wish.depth_words = std::move(source->words);
    sound = check_return_period(map, *entry, wish) && sound;
    if (!sound) return std::nullopt;
    wish.pattern = *pattern;
    wish.every_h = *every;
    return wish;
}

}  // namespace

std::optional<Hyetograph> read_design(const Reading& reading, const Entry& entry, Storm& storm) {
    const auto map = ClosedMap::read(reading, entry, "design", kDesignKeys, kDesignExample);
    if (!map) return std::nullopt;
    const auto wish = read_wish(*map, storm);
    if (!wish) return std::nullopt;
    MadeStorm made = storm_of_design(*wish);
    for (const std::string& warning : made.warnings)
        reading.warning(map->mark_of("every"), warning);
    if (!made.storm) {
        reading.error(map->mark_of(blamed_key(*wish, made.problem)), made.problem, made.hint);
        return std::nullopt;
    }
    storm.origin = std::move(made.storm->origin);
    return std::move(made.storm->rain);
}

}  // namespace rainledger
