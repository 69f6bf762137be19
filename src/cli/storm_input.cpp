#include <algorithm>
#include <initializer_list>
#include <string_view>
#include <utility>
#include <vector>

#include "cli/storm_sources.hpp"
#include "rainledger/scenario/storm_making.hpp"

namespace rainledger {
namespace {

/// The cells of a header row in small letters, without blanks, quotes or units.
std::vector<std::string> header_names(std::string_view line) {
    std::vector<std::string> names(1);
    bool in_unit = false;
    for (const char c : line) {
        in_unit = c == '[' || (in_unit && c != ']');
        if (c == ',' || c == ';' || c == '\t')
            names.emplace_back();
        else if (!in_unit && std::string_view(" \r\"]").find(c) == std::string_view::npos)
            names.back() += lower(c);
    }
    return names;
}

}  // namespace

bool looks_like_tips(const std::string& text) {
    const std::vector<std::string> names = header_names(first_line(text));
    const auto holds = [&](std::initializer_list<std::string_view> wanted) {
        return std::ranges::any_of(wanted, [&](std::string_view name) {
            return std::ranges::find(names, name) != names.end();
        });
    };
    if (holds({"depth", "intensity", "cumulative"})) return false;
    return (names.size() == 1 && holds({"time"})) || holds({"tips", "count"});
}

std::optional<StormInput> read_storm_input(const StormOptions& options, Diagnostics& diagnostics) {
    auto text = read_file(options.input, diagnostics);
    if (!text) return std::nullopt;
    if (has_yaml_ending(options.input))
        return StormInput{InputKind::scenario, *std::move(text), "by its ending"};
    if (options.tip_mm) return StormInput{InputKind::rain, *std::move(text), {}};
    if (looks_like_statistics(*text))
        return StormInput{InputKind::statistics, *std::move(text), "its rows are durations"};
    if (begins_as_yaml(*text))
        return StormInput{InputKind::scenario, *std::move(text), "it begins with a key"};
    return StormInput{InputKind::rain, *std::move(text), {}};
}

std::string take_steps(const StormOptions& options, Storm& storm) {
    constexpr double kMostSteps = 1.0e7;  // a slip in --every, not a wish
    if (!options.every_h) return {};
    if (own_duration_h(storm.rain) > kMostSteps * *options.every_h)
        return "--every: that step would cut a storm into more than 10 million";
    const std::optional<ResampledFrom> before = storm.resampled;
    resample_storm(storm, *options.every_h);
    // Peaks are told before the allowance, and the first of two changes of step counts.
    if (storm.multiply_by > 0.0) {
        storm.resampled->peak_before_mm_per_h /= storm.multiply_by;
        storm.resampled->peak_after_mm_per_h /= storm.multiply_by;
    }
    if (before) storm.resampled->peak_before_mm_per_h = before->peak_before_mm_per_h;
    storm.continued_h = 0.0;
    return {};
}

}  // namespace rainledger
