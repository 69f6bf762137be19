// A design storm from depths by duration, and the events in the tips of a gauge.
#include <cstdio>
#include <string>

#include <rainledger/rain/design_storm.hpp>
#include <rainledger/rain/rain_events.hpp>

int main() {
    using namespace rainledger;

    // Depths in mm by duration in h, of one return period.
    const DepthList county{{1.0 / 12, 0.25, 0.5, 1.0}, {12.5, 23.5, 32.5, 41.0}};
    DesignRequest wish;
    wish.pattern = StormPattern::alternating_blocks;
    wish.duration_h = 1.0;
    wish.every_h = 1.0 / 12;
    wish.depth = DepthDuration(county);
    const DesignStorm design = make_design_storm(wish);
    if (!design.rain) {
        std::printf("%s; %s\n", design.problem.c_str(), design.hint.c_str());
        return 1;
    }
    std::printf("design storm: %.1f mm in %zu steps, at most %.0f mm/h\n", design.depth_mm,
                design.rain->steps(), peak_intensity_mm_per_h(*design.rain));

    const std::string log =
        "time\n"
        "2031-06-12T06:02:11Z\n"
        "2031-06-14T13:52:07Z\n"
        "2031-06-14T13:53:41Z\n"
        "2031-06-14T14:01:30Z\n";
    RecordLayout layout;
    layout.tip_mm = 0.2;
    Diagnostics diagnostics;
    const auto record = read_gauge_record("logger.csv", log, layout, diagnostics);
    for (const Diagnostic& diagnostic : diagnostics.list())
        std::printf("%s", render(diagnostic).c_str());
    if (!record) return 1;

    const EventRule rule;    // parted by 6 h without rain
    const EventSteps steps;  // tips in steps of 5 min
    for (const RainEvent& event : find_events(*record, rule, steps).events) {
        const Hyetograph rain = event_rain(*record, event, rule, steps);
        std::printf("event %zu: %.1f mm in %zu steps from %s, %.1f mm in the five days before\n",
                    event.number, event.depth_mm, rain.steps(), iso_stamp(*rain.stamps, 0).c_str(),
                    event.antecedent_5_day_mm);
    }
    return 0;
}
