#include "cli/lookup_options.hpp"

#include <algorithm>

#include "cli/option_values.hpp"
#include "rainledger/base/number.hpp"
#include "rainledger/base/suggest.hpp"

namespace rainledger {
namespace {

constexpr std::string_view kShared = "json units quiet";

/// True if `word` is one of the words of `list`.
bool holds(std::string_view list, std::string_view word) {
    while (!list.empty()) {
        const std::string_view one = list.substr(0, list.find(' '));
        if (one == word) return true;
        list.remove_prefix(std::min(one.size() + 1, list.size()));
    }
    return false;
}

std::string topics_of(std::string_view option) {
    std::string out;
    for (const LookupTopic& topic : kLookupTopics)
        if (holds(topic.options, option))
            out += (out.empty() ? "" : " and ") + std::string(topic.name);
    return out;
}

/// An option that goes with another topic.
std::string misplaced(const Arguments& arguments, const LookupTopic& topic) {
    for (const OptionRow& row : kLookupOptions)
        if (arguments.has(row.name) && !holds(kShared, row.name) && !holds(topic.options, row.name))
            return "--" + std::string(row.name) + " goes with " + topics_of(row.name) +
                   ", not with " + std::string(topic.name);
    return {};
}

std::string read_share(const Arguments& arguments, std::string_view option,
                       std::optional<double>& share) {
    const std::string* text = arguments.find(option);
    if (text == nullptr) return {};
    const std::string lead = "--" + std::string(option) + ": ";
    const ParsedQuantity parsed = parse_share(*text);
    if (!parsed.value) return lead + parsed.problem + "; " + parsed.hint;
    if (!(*parsed.value >= 0.0 && *parsed.value <= 1.0))
        return lead + "'" + *text + "' is no share; it must be from 0 to 1, or from 0 % to 100 %";
    share = parsed.value;
    return {};
}

/// "42" and "42 %" alike, as they stand, so that the bounds of the classes fall as written.
std::string read_percent(const Arguments& arguments, std::string_view option,
                         std::optional<double>& percent) {
    const std::string* text = arguments.find(option);
    if (text == nullptr) return {};
    std::string_view digits = *text;
    if (digits.ends_with('%')) digits.remove_suffix(1);
    while (digits.ends_with(' '))
        digits.remove_suffix(1);
    percent = parse_number(digits);
    if (percent && *percent >= 0.0 && *percent <= 100.0) return {};
    return "--" + std::string(option) + ": '" + *text +
           "' is no percentage; write a number from 0 to 100";
}

std::string read_slope(const Arguments& arguments, std::optional<double>& slope_percent) {
    constexpr double kPerCent = 100.0;
    std::optional<double> share;
    std::string problem = read_share(arguments, "slope", share);
    if (share) slope_percent = kPerCent * *share;
    return problem;
}

std::string read_condition(const Arguments& arguments,
                           std::optional<HydrologicCondition>& condition) {
    constexpr std::array<std::string_view, 3> kWords{"good", "fair", "poor"};
    const std::string* text = arguments.find("condition");
    if (text == nullptr) return {};
    condition = find_condition(*text);
    if (condition) return {};
    return "--condition: '" + *text + "' is not known; " + suggestion(*text, kWords);
}

std::string read_group(const Arguments& arguments, std::optional<SoilGroupRating>& group) {
    const std::string* text = arguments.find("soil-group");
    if (text == nullptr) return {};
    const auto parsed = parse_soil_group(*text);
    group = parsed.value;
    if (group) return {};
    return "--soil-group: " + parsed.problem + "; " + parsed.hint;
}

std::string read_values(const Arguments& arguments, LookupAsked& asked) {
    std::string problem = read_units(arguments, asked.units);
    const auto then = [&](std::string next) {
        if (problem.empty()) problem = std::move(next);
    };
    const auto amount = [&](std::string_view option, Dimension dimension, std::string_view noun,
                            std::optional<double>& value) {
        then(read_amount(arguments, option, dimension, noun, value, Zero::allowed));
    };
    read_text(arguments, "treatment", asked.treatment);
    then(read_condition(arguments, asked.condition));
    then(read_group(arguments, asked.soil_group));
    then(read_share(arguments, "impervious", asked.impervious_share));
    then(read_share(arguments, "connected", asked.connected_share));
    then(read_share(arguments, "saturation", asked.saturation));
    then(read_percent(arguments, "sand", asked.sand_percent));
    then(read_percent(arguments, "clay", asked.clay_percent));
    then(read_percent(arguments, "organic", asked.organic_percent));
    then(read_share(arguments, "porosity", asked.porosity));
    amount("conductivity", Dimension::rate, "conductivity", asked.conductivity_mm_per_h);
    amount("impermeable-layer", Dimension::depth, "depth", asked.impermeable_depth_mm);
    amount("water-table", Dimension::depth, "depth", asked.water_table_depth_mm);
    then(read_slope(arguments, asked.slope_percent));
    amount("rain", Dimension::depth, "depth", asked.rain_mm);
    amount("height", Dimension::depth, "height", asked.crop_height_mm);
    return problem;
}

/// A value that fell apart left its unit among the words.
bool left_a_unit(std::span<const std::string> words) {
    return std::ranges::any_of(words, [](const std::string& word) {
        return word == "%" || find_unit(word, Dimension::depth) || find_unit(word, Dimension::rate);
    });
}

std::string find_topic(const Arguments& arguments, LookupOptions& options) {
    const std::string& typed = arguments.words.front();
    const auto found = std::ranges::find(kLookupTopics, typed, &LookupTopic::name);
    if (found != kLookupTopics.end()) {
        options.topic = &*found;
        return misplaced(arguments, *found);
    }
    std::vector<std::string_view> names;
    names.reserve(kLookupTopics.size());
    for (const LookupTopic& topic : kLookupTopics)
        names.push_back(topic.name);
    return "unknown topic '" + typed + "'; " + suggestion(typed, names);
}

/// The name as one, however many words it was typed in.
std::string joined(std::span<const std::string> words) {
    std::string out;
    for (const std::string& word : words)
        out += (out.empty() ? "" : " ") + word;
    return out;
}

std::string read_topic(const Arguments& arguments, LookupOptions& options) {
    if (std::string problem = find_topic(arguments, options); !problem.empty()) return problem;
    const auto names = std::span(arguments.words).subspan(1);
    options.asked.name = joined(names);
    std::string problem = read_values(arguments, options.asked);
    if (!problem.empty() && left_a_unit(names))
        problem += " (a number and its unit are one word: '3.4 mm/h')";
    return problem;
}

}  // namespace

std::vector<Output> LookupOptions::outputs() const {
    std::vector<Output> outputs;
    add_output(outputs, "json", json);
    return outputs;
}

std::optional<LookupOptions> read_lookup_options(std::span<const std::string> given,
                                                 std::string& problem) {
    const Arguments arguments = sort_arguments(given, kLookupOptions);
    problem = arguments.problem;
    LookupOptions options;
    if (problem.empty() && !arguments.words.empty()) problem = read_topic(arguments, options);
    if (problem.empty() && arguments.words.empty() && !arguments.options.empty())
        problem = "--" + arguments.options.begin()->first +
                  " needs a topic; 'rainledger lookup' lists them";
    if (!problem.empty()) return std::nullopt;
    options.quiet = arguments.has("quiet");
    read_text(arguments, "json", options.json);
    return options;
}

std::string topic_lines() {
    constexpr std::size_t kTextColumn = 26;
    std::string out;
    for (const LookupTopic& topic : kLookupTopics) {
        std::string head = "  " + std::string(topic.name) + " " + std::string(topic.takes);
        head.resize(kTextColumn, ' ');
        out += head + std::string(topic.text) + "\n";
    }
    return out;
}

}  // namespace rainledger
