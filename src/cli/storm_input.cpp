#include <algorithm>
#include <filesystem>
#include <initializer_list>
#include <string_view>
#include <utility>
#include <vector>

#include "cli/storm_sources.hpp"
#include "rainledger/base/whole_file.hpp"
#include "rainledger/scenario/storm_making.hpp"

namespace rainledger {
namespace {

char lower(char c) {
    return c >= 'A' && c <= 'Z' ? static_cast<char>(c - 'A' + 'a') : c;
}

bool has_scenario_ending(const std::string& path) {
    std::string ending = std::filesystem::path(path).extension().string();
    std::ranges::transform(ending, ending.begin(), lower);
    return ending == ".yaml" || ending == ".yml";
}

/// The first line that says something: neither blank nor a comment.
std::string_view first_line(std::string_view text) {
    constexpr std::string_view kBlanks = " \t\r";
    while (!text.empty()) {
        const std::size_t end = std::min(text.find('\n'), text.size());
        const std::string_view line = text.substr(0, end);
        const std::size_t at = line.find_first_not_of(kBlanks);
        if (at != std::string_view::npos && line[at] != '#') return line.substr(at);
        text.remove_prefix(std::min(end + 1, text.size()));
    }
    return {};
}

/// A key with its colon, or a marker of YAML: no row of a CSV file begins so.
bool begins_as_scenario(std::string_view text) {
    const std::string_view line = first_line(text);
    if (line.starts_with("---") || line.starts_with("{") || line.starts_with("%YAML")) return true;
    const std::size_t colon = line.find(':');
    if (colon == std::string_view::npos || colon == 0) return false;
    const bool ends_key = colon + 1 == line.size() || line[colon + 1] == ' ' ||
                          line[colon + 1] == '\r' || line[colon + 1] == '\t';
    return ends_key && line.substr(0, colon).find_first_of(",;\t \"") == std::string_view::npos;
}

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

std::optional<std::string> read_file(const std::string& path, Diagnostics& diagnostics) {
    std::string problem;
    auto text = read_whole_file(path, problem);
    if (!text) diagnostics.unreadable({path, 0, 0, {}}, "cannot read the file: " + problem);
    return text;
}

std::optional<StormInput> read_storm_input(const StormOptions& options, Diagnostics& diagnostics) {
    auto text = read_file(options.input, diagnostics);
    if (!text) return std::nullopt;
    if (has_scenario_ending(options.input))
        return StormInput{InputKind::scenario, *std::move(text), "by its ending"};
    if (options.tip_mm) return StormInput{InputKind::rain, *std::move(text), {}};
    if (looks_like_statistics(*text))
        return StormInput{InputKind::statistics, *std::move(text), "its rows are durations"};
    if (begins_as_scenario(*text))
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
