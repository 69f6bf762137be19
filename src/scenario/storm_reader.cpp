#include "scenario/storm_reader.hpp"

#include <algorithm>
#include <utility>

#include "rainledger/base/cut.hpp"
#include "rainledger/scenario/storm_making.hpp"
#include "scenario/name_check.hpp"
#include "scenario/shown.hpp"

namespace rainledger {
namespace {

constexpr double kLargeFactor = 3.0;  // common practice: allowances are far below
constexpr double kMostAppended = 1.0e6;
constexpr double kMostResampled = 1.0e6;
constexpr double kSameDuration = 1.0e-9;  // relative: rounding of a sum of steps

constexpr const char* kStormExample =
    "write 'storm: {hyetograph: rain.csv}', or 'steps', 'design' or 'record' in its place";

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

void resample_rain(const ClosedMap& map, Storm& storm) {
    const Entry* entry = map.find("resample");
    if (entry == nullptr) return;
    const auto every_h = read_step_length(map.reading(), *entry);
    if (!every_h || storm.rain.steps() == 0) return;
    const double duration_h = own_duration_h(storm.rain);
    if (*every_h > duration_h * (1.0 + kSameDuration)) {
        map.reading().error(entry->mark(),
                            "resample: " + map.shown("resample") + " is longer than the storm, " +
                                brief_time(duration_h),
                            "its rain would be spread over time in which none fell: shorten it");
        return;
    }
    if (duration_h / *every_h > kMostResampled) {
        map.reading().error(entry->mark(),
                            "resample: " + map.shown("resample") +
                                " would cut the storm into more than a million steps",
                            "lengthen it; rain says nothing between its own steps");
        return;
    }
    resample_storm(storm, *every_h);
}

/// The rain of a storm, from exactly one of its forms.
std::optional<Hyetograph> read_rain(const ClosedMap& map, Storm& storm) {
    const Entry* form = map.exactly_one(
        kRainForms, map.what() + " has no rain",
        "add 'hyetograph: rain.csv', 'steps: {every: 5 min, depths: [0.4, 1.1], unit: mm}', "
        "'design: {...}' or 'record: {...}'",
        "keep the one that holds its rain");
    if (form == nullptr) return std::nullopt;
    if (form->key == "hyetograph") return read_hyetograph(map.reading(), *form, storm);
    if (form->key == "steps") return read_steps(map.reading(), *form);
    if (form->key == "design") return read_design(map.reading(), *form, storm);
    return read_event(map.reading(), *form, storm);
}

Storm read_storm(const Reading& reading, const Entry& entry, std::string name) {
    Storm read;
    read.place = reading.at(entry.key_mark);
    const std::string what = name == "storm" ? "the storm" : "storm " + in_quotes(name);
    read.name = std::move(name);
    const auto map = ClosedMap::read(reading, entry, what, kStormKeys, kStormExample);
    if (!map) return read;
    read.multiply_by = read_factor(*map);
    if (auto rain = read_rain(*map, read)) read.rain = *std::move(rain);
    resample_rain(*map, read);
    multiply_depths(read.rain, read.multiply_by);
    continue_dry(*map, read);
    return read;
}

/// The storms of a record, which leave no place for others beside them.
std::vector<Storm> read_record_alone(const Reading& reading, const std::vector<Entry>& entries,
                                     const Entry& from_record) {
    if (entries.size() > 1)
        reading.error(from_record.key_mark, "'from_record' stands alone under 'storms'",
                      "take the other storms out, or name events one by one with 'record'");
    return read_from_record(reading, from_record);
}

/// Whether what belongs into a storm stands in the place of one: 'storms: {design: {...}}'. A
/// storm may have such a name where its own rain stands below it.
bool is_nameless(const Reading& reading, const Entry& entry) {
    if (!holds(kRainForms, entry.key)) return false;
    if (entry.value.IsMap())
        for (const auto& inner : entry.value)
            if (inner.first.IsScalar() && holds(kRainForms, inner.first.Scalar())) return false;
    reading.error(entry.key_mark,
                  in_quotes(entry.key) + " stands where the name of a storm belongs",
                  "give the storm a name, 'storms: {july: {" + entry.key +
                      ": ...}}', or write 'storm:' for a single one");
    return true;
}

std::vector<Storm> read_named_storms(const Reading& reading, const Entry& entry) {
    const std::string hint = "write 'storms:' with one name per storm, each with its own rain";
    std::vector<Storm> storms;
    if (!is_map(reading, entry, "a map of storms", hint)) return storms;
    const std::vector<Entry> entries = entries_of(reading, entry, "storms");
    const auto from_record = std::ranges::find(entries, kFromRecord, &Entry::key);
    if (from_record != entries.end()) return read_record_alone(reading, entries, *from_record);
    for (const Entry& named : entries) {
        if (is_nameless(reading, named)) continue;
        static_cast<void>(is_name(reading, named, "storm"));
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
