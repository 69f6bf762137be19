#include "scenario/storm_reader.hpp"

#include <utility>

#include "rainledger/base/cut.hpp"
#include "scenario/plain_text.hpp"

namespace rainledger {
namespace {

constexpr double kLargeFactor = 3.0;  // common practice: allowances are far below
constexpr double kMostAppended = 1.0e6;

constexpr const char* kStormExample =
    "write 'storm: {hyetograph: rain.csv}', or 'steps' in place of the file";

/// The factor on depths, or 1.
double read_factor(const ClosedMap& map) {
    const Entry* entry = map.find("multiply_by");
    if (entry == nullptr) return 1.0;
    const auto factor =
        read_bare(map.reading(), *entry, "write a plain number of zero or more, such as 1.2");
    map.warn_above("multiply_by", factor, kLargeFactor, "3", "an allowance of 20 % is written 1.2");
    return factor.value_or(1.0);
}

void continue_dry(const ClosedMap& map, Storm& storm) {
    const auto hours = map.quantity("continue_for", Dimension::time, Least::above_zero);
    if (!hours || storm.rain.steps() == 0) return;
    if (*hours / storm.rain.duration_h.back() > kMostAppended) {
        map.reading().error(map.mark_of("continue_for"),
                            "continue_for: " + map.shown("continue_for") +
                                " would append more than a million steps as long as the last",
                            "shorten it; draining takes hours, seldom days");
        return;
    }
    storm.continued_h = *hours;
    append_dry_time(storm.rain, *hours);
}

/// The rain of a storm, from exactly one of its forms.
std::optional<Hyetograph> read_rain(const ClosedMap& map, Storm& storm) {
    const Entry* hyetograph = map.find("hyetograph");
    const Entry* steps = map.find("steps");
    if (hyetograph != nullptr && steps != nullptr)
        map.reading().error(steps->key_mark,
                            map.what() + " takes one of 'hyetograph' or 'steps', not both",
                            "keep the one that holds its rain");
    else if (hyetograph != nullptr)
        return read_hyetograph(map.reading(), *hyetograph, storm.file);
    else if (steps != nullptr)
        return read_steps(map.reading(), *steps);
    else if (!map.is_misnamed("hyetograph") && !map.is_misnamed("steps"))
        map.reading().error(map.owner_mark(), map.what() + " has no rain",
                            "add 'hyetograph: rain.csv' or 'steps: {every: 5 min, depths: [0.4, "
                            "1.1], unit: mm}'");
    return std::nullopt;
}

Storm read_storm(const Reading& reading, const Entry& entry, std::string name) {
    Storm read;
    read.place = reading.at(entry.key_mark);
    const std::string what = name == "storm" ? "the storm" : "storm " + in_quotes(name);
    read.name = std::move(name);
    const auto map = ClosedMap::read(reading, entry, what, kStormKeys, kStormExample);
    if (!map) return read;
    read.multiply_by = read_factor(*map);
    if (auto rain = read_rain(*map, read)) {
        read.rain = std::move(*rain);
        multiply_depths(read.rain, read.multiply_by);
    }
    continue_dry(*map, read);
    return read;
}

void check_storm_name(const Reading& reading, const Entry& entry) {
    const std::string hint = "names stand in tables and paths: use words, '-' and '_'";
    if (is_blank(entry.key))
        reading.error(entry.key_mark, "a storm's name is empty", hint);
    else if (entry.key.find_first_of(".,\n\r") != std::string::npos)
        reading.error(entry.key_mark,
                      "storm name " + in_quotes(entry.key) + " holds a dot, comma or newline",
                      hint);
    else if (holds_hidden_characters(entry.key))
        reading.error(entry.key_mark,
                      "storm name " + in_quotes(entry.key) + " holds a character that is not shown",
                      kHiddenHint);
}

std::vector<Storm> read_named_storms(const Reading& reading, const Entry& entry) {
    const std::string hint = "write 'storms:' with one name per storm, each with its own rain";
    std::vector<Storm> storms;
    if (!is_map(reading, entry, "a map of storms", hint)) return storms;
    for (const Entry& named : entries_of(reading, entry, "storms")) {
        check_storm_name(reading, named);
        storms.push_back(read_storm(reading, named, named.key));
    }
    if (entry.value.size() == 0) reading.error(entry.mark(), "'storms' names no storm", hint);
    return storms;
}

}  // namespace

std::vector<Storm> read_storms(const ClosedMap& scenario) {
    const Reading& reading = scenario.reading();
    const Entry* one = scenario.find("storm");
    const Entry* several = scenario.find("storms");
    if (one != nullptr && several != nullptr)
        reading.error(several->key_mark, "a scenario takes one of 'storm' or 'storms', not both",
                      "move the single storm under 'storms:' with a name of its own");
    std::vector<Storm> storms;
    if (one != nullptr) storms.push_back(read_storm(reading, *one, "storm"));
    if (several != nullptr)
        for (Storm& storm : read_named_storms(reading, *several))
            storms.push_back(std::move(storm));
    if (one == nullptr && several == nullptr && !scenario.is_misnamed("storm") &&
        !scenario.is_misnamed("storms"))
        reading.error(scenario.owner_mark(), "the scenario has no storm", kStormExample);
    return storms;
}

}  // namespace rainledger
