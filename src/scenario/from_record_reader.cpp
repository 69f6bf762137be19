#include <algorithm>
#include <cstddef>
#include <iterator>
#include <set>
#include <string>
#include <utility>
#include <vector>

#include "rainledger/base/cut.hpp"
#include "rainledger/scenario/storm_making.hpp"
#include "scenario/record_reader.hpp"
#include "scenario/shown.hpp"
#include "scenario/storm_reader.hpp"

// The events of a gauge record as the storms of a scenario.
namespace rainledger {
namespace {

constexpr std::size_t kMostNamed = 3;
constexpr const char* kFromRecordExample =
    "write 'from_record: {file: logger.csv, tip: 0.2 mm, at_least: 10 mm}'";

using Chosen = std::vector<const RainEvent*>;

void refuse_none(const ClosedMap& map, const RecordEvents& events, const GaugeRecord& record) {
    if (events.events.empty()) {
        refuse_no_event(map.reading(), map.owner_mark(), record);
        return;
    }
    const std::size_t count = events.events.size();
    const double most = std::ranges::max_element(events.events, {}, &RainEvent::depth_mm)->depth_mm;
    map.reading().error(map.mark_of("at_least"),
                        "no event of " + in_quotes(record.file) + " has " + map.shown("at_least") +
                            " or more; " + std::to_string(count) + (count == 1 ? " has" : " have") +
                            " less",
                        "the largest has " + brief(most) + " mm");
}

bool few_enough(const ClosedMap& map, const Chosen& chosen, const ReadRecord& read) {
    std::size_t steps = 0;
    for (const RainEvent* event : chosen) {
        steps += steps_of(read.record, *event, read.source.steps);
        if (steps > kMostEventSteps) {
            refuse_steps(map, "the storms");
            return false;
        }
    }
    return true;
}

/// Names of events, the first few of many.
std::string named(const GaugeRecord& record, const Chosen& events) {
    std::string out;
    for (std::size_t i = 0; i < std::min(events.size(), kMostNamed); ++i)
        out += (i == 0 ? "" : ", ") + event_name(record, *events[i]);
    if (events.size() > kMostNamed)
        out += " and " + std::to_string(events.size() - kMostNamed) + " more";
    return out;
}

/// Warns once of all events of which something holds.
template <class Holds>
void warn_of_those(const ClosedMap& map, const GaugeRecord& record, const Chosen& events,
                   Holds holds, const std::string& problem, const std::string& hint) {
    Chosen those;
    std::ranges::copy_if(events, std::back_inserter(those), holds);
    if (those.empty()) return;
    map.reading().warning(map.owner_mark(), problem + ": " + named(record, those), hint);
}

std::vector<Storm> make_storms(const ClosedMap& map, const RecordEvents& events,
                               const Chosen& chosen, const ReadRecord& read) {
    std::vector<Storm> storms;
    std::set<std::string> names;
    for (const RainEvent* event : chosen) {
        storms.push_back(storm_of_event(read.record, events, *event, read.source, read.table()));
        Storm& storm = storms.back();
        storm.place = map.reading().at(map.owner_mark());
        // Clocks may read the same again: seconds apart, or when they are set back.
        if (!names.insert(storm.name).second)
            storm.name += " (event " + std::to_string(event->number) + ")";
    }
    return storms;
}

}  // namespace

std::vector<Storm> read_from_record(const Reading& reading, const Entry& entry) {
    const std::size_t errors_before = reading.diagnostics().error_count();
    const auto map =
        ClosedMap::read(reading, entry, "from_record", kFromRecordKeys, kFromRecordExample);
    if (!map) return {};
    const double least_mm = map->quantity("at_least", Dimension::depth).value_or(0.0);
    const auto read = read_record(*map, errors_before);
    if (!read) return {};
    const RecordEvents events = find_events(read->record, read->source.rule, read->source.steps);
    Chosen chosen;
    for (const RainEvent& event : events.events)
        if (event.depth_mm >= least_mm) chosen.push_back(&event);
    if (chosen.empty()) refuse_none(*map, events, read->record);
    if (chosen.empty() || !few_enough(*map, chosen, *read)) return {};
    warn_of_those(
        *map, read->record, chosen, [](const RainEvent* event) { return !event->antecedent_known; },
        kAntecedentUnknown, kAntecedentHint);
    warn_of_those(
        *map, read->record, chosen,
        [](const RainEvent* event) { return event->without_data_h > 0.0; },
        "hours without data in the record were taken as dry", kNoDataHint);
    return make_storms(*map, events, chosen, *read);
}

}  // namespace rainledger
