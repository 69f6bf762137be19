#include "cli/storm_options.hpp"

#include <algorithm>
#include <string_view>

#include "cli/option_values.hpp"
#include "rainledger/base/number.hpp"
#include "rainledger/rain/hyetograph_csv.hpp"
#include "rainledger/reference/mass_curves.hpp"

namespace rainledger {
namespace {

template <class Value>
struct Word {
    std::string_view name;
    Value value;
};

constexpr std::array kPatterns{
    Word<StormPattern>{"alternating_blocks", StormPattern::alternating_blocks},
    Word<StormPattern>{"keifer_chu", StormPattern::keifer_chu},
    Word<StormPattern>{"triangular", StormPattern::triangular},
    Word<StormPattern>{"uniform", StormPattern::uniform},
    Word<StormPattern>{"mass_curve", StormPattern::mass_curve},
};
constexpr std::array kOrders{
    Word<EventOrder>{"time", EventOrder::time},
    Word<EventOrder>{"depth", EventOrder::depth},
    Word<EventOrder>{"peak_5", EventOrder::peak_5},
    Word<EventOrder>{"peak_15", EventOrder::peak_15},
    Word<EventOrder>{"peak_30", EventOrder::peak_30},
    Word<EventOrder>{"peak_60", EventOrder::peak_60},
    Word<EventOrder>{"rarity", EventOrder::rarity},
};

/// One word of a closed list.
template <class Value, std::size_t size>
std::string read_word(const Arguments& arguments, std::string_view option,
                      const std::array<Word<Value>, size>& words, std::optional<Value>& value) {
    const std::string* text = arguments.find(option);
    if (text == nullptr) return {};
    std::vector<std::string_view> names;
    for (const Word<Value>& word : words) {
        names.push_back(word.name);
        if (*text == word.name) value = word.value;
    }
    return value ? std::string() : unknown_word(option, *text, names);
}

std::string read_curve(const Arguments& arguments, StormOptions& options) {
    read_text(arguments, "curve", options.curve);
    if (!options.curve || find_mass_curve(*options.curve) != nullptr) return {};
    std::vector<std::string_view> names;
    for (const MassCurveEntry& entry : mass_curve_table())
        names.push_back(entry.name);
    return unknown_word("curve", *options.curve, names);
}

std::string read_peak_at(const Arguments& arguments, StormOptions& options) {
    const std::string* text = arguments.find("peak-at");
    if (text == nullptr) return {};
    const ParsedQuantity parsed = parse_share(*text);
    if (!parsed.value) return "--peak-at: " + parsed.problem + "; " + parsed.hint;
    if (!(*parsed.value >= 0.0 && *parsed.value <= 1.0))
        return "--peak-at: '" + *text + "' is no share of the duration; it must be from 0 to 1";
    options.peak_at = parsed.value;
    return {};
}

std::string read_event(const Arguments& arguments, StormOptions& options) {
    constexpr double kMostEvents = 1.0e9;
    const std::string* text = arguments.find("event");
    if (text == nullptr) return {};
    if (*text == "largest") {
        options.event = 0;
        return {};
    }
    const auto number = parse_number(*text);
    const bool sound = number && *number >= 1.0 && *number <= kMostEvents &&
                       text->find_first_not_of("0123456789") == std::string::npos;
    if (!sound)
        return "--event: '" + *text +
               "' is no event; write its number in the list of events, or 'largest'";
    options.event = static_cast<std::size_t>(*number);
    return {};
}

std::string read_zone(const Arguments& arguments, StormOptions& options) {
    read_text(arguments, "zone", options.zone);
    if (!options.zone || is_known_zone(*options.zone)) return {};
    return "--zone: '" + *options.zone +
           "' is not in the time zone database; write a zone by its place, such as 'Europe/Madrid'";
}

std::string read_values(const Arguments& arguments, StormOptions& options) {
    std::string problem = read_units(arguments, options.units);
    const auto then = [&](std::string next) {
        if (problem.empty()) problem = std::move(next);
    };
    const auto amount = [&](std::string_view option, Dimension dimension, std::string_view noun,
                            std::optional<double>& value, Zero zero = Zero::refused) {
        then(read_amount(arguments, option, dimension, noun, value, zero));
    };
    amount("every", Dimension::time, "step", options.every_h);
    amount("duration", Dimension::time, "duration", options.duration_h);
    amount("return-period", Dimension::frequency, "return period", options.return_period_yr);
    then(read_word(arguments, "pattern", kPatterns, options.pattern));
    then(read_peak_at(arguments, options));
    then(read_curve(arguments, options));
    amount("tip", Dimension::depth, "tip", options.tip_mm);
    then(read_zone(arguments, options));
    amount("dry-spell", Dimension::time, "dry spell", options.dry_spell_h);
    amount("threshold", Dimension::depth, "threshold", options.threshold_mm, Zero::allowed);
    then(read_word(arguments, "sort", kOrders, options.sort));
    then(read_event(arguments, options));
    return problem;
}

std::string file_problem(const StormOptions& options) {
    if (options.csv == "-")
        return "--csv: the steps go to a file, not to '-'; for standard output write --csv "
               "/dev/stdout";
    if (std::string problem = chart_problem(options.chart); !problem.empty()) return problem;
    if (std::string problem = standard_output_problem(options.json, options.chart);
        !problem.empty())
        return problem;
    const std::vector<Output> outputs = options.outputs();
    if (options.statistics)
        if (std::string problem =
                outputs_problem(outputs, *options.statistics, "table of statistics");
            !problem.empty())
            return problem;
    return outputs_problem(outputs, options.input, "input");
}

}  // namespace

bool StormOptions::has(std::string_view option) const {
    return std::ranges::find(given, option) != given.end();
}

std::optional<std::string> StormOptions::first_of(std::span<const OptionRow> rows) const {
    for (const OptionRow& row : rows)
        if (has(row.name)) return std::string(row.name);
    return std::nullopt;
}

std::vector<Output> StormOptions::outputs() const {
    std::vector<Output> outputs;
    add_output(outputs, "csv", csv);
    add_output(outputs, "json", json);
    add_output(outputs, "chart", chart);
    return outputs;
}

std::optional<StormOptions> read_storm_options(std::span<const std::string> given,
                                               std::string& problem) {
    const Arguments arguments = sort_arguments(given, kStormOptions);
    problem = arguments.problem;
    if (problem.empty())
        problem = input_problem(
            arguments, {"storm", "input", "write a quantity as one word: --every '5 min'", true});
    if (!problem.empty()) return std::nullopt;

    StormOptions options;
    options.input = arguments.words.front();
    for (const OptionRow& row : kStormOptions)
        if (arguments.has(row.name)) options.given.emplace_back(row.name);
    options.quiet = arguments.has("quiet");
    options.fit_formula = arguments.has("fit-formula");
    options.spread_tips = arguments.has("spread-tips");
    options.events = arguments.has("events");
    read_text(arguments, "csv", options.csv);
    read_text(arguments, "json", options.json);
    read_text(arguments, "chart", options.chart);
    read_text(arguments, "storm", options.storm);
    read_text(arguments, "statistics", options.statistics);
    problem = read_values(arguments, options);
    if (problem.empty()) problem = file_problem(options);
    if (!problem.empty()) return std::nullopt;
    return options;
}

}  // namespace rainledger
