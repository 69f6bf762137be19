#pragma once

#include <cstdlib>
#include <optional>
#include <string>
#include <utility>
#include <vector>

#include "rainledger/ledger/ledger.hpp"
#include "rainledger/scenario/scenario.hpp"

// Scenarios to draw, and the surroundings of a run of gnuplot.
namespace rainledger::scenes {

inline Storm storm_of(std::string name, Hyetograph rain) {
    Storm storm;
    storm.name = std::move(name);
    storm.rain = std::move(rain);
    return storm;
}

/// Half an hour with one peak, in steps of 5 minutes: 20.0 mm.
inline Hyetograph half_an_hour() {
    return make_hyetograph({0.0, 5.0, 10.0, 15.0, 20.0, 25.0, 30.0}, "min",
                           {0.5, 3.0, 9.0, 5.0, 2.0, 0.5});
}

/// Steps of every length with a dry one between: 12.4 mm.
inline Hyetograph uneven() {
    return make_hyetograph({0.0, 5.0, 12.0, 30.0, 60.0, 61.0}, "min", {0.4, 1.0, 0.0, 8.0, 3.0});
}

/// From 2031-11-03 22:00 at UTC+1, five steps of an hour.
inline Hyetograph over_midnight() {
    constexpr std::int64_t kFirst = 1951506000000;
    constexpr std::int64_t kHour = 3'600'000;
    StampedEdges edges;
    for (std::int64_t i = 0; i <= 5; ++i) {
        edges.unix_ms.push_back(kFirst + i * kHour);
        edges.offset_minutes.push_back(60);
    }
    edges.has_offset = true;
    return make_hyetograph(std::move(edges), {1.0, 4.0, 2.0, 0.0, 1.0});
}

inline Surface lawn() {
    Surface surface;
    surface.name = "lawn";
    surface.area_m2 = 2800.0;
    surface.interception_mm = 1.0;
    surface.depression_storage_mm = 4.0;
    surface.losses = Horton{{50.0, 6.0, 4.14}};
    return surface;
}

inline Surface roof() {
    Surface surface;
    surface.name = "roof";
    surface.area_m2 = 500.0;
    surface.losses = Impervious{};
    return surface;
}

inline Scenario scenario_of(std::string title, std::vector<Storm> storms,
                            std::vector<Surface> surfaces = {lawn()}) {
    Scenario scenario;
    scenario.title = std::move(title);
    scenario.storms = std::move(storms);
    scenario.site.surfaces = std::move(surfaces);
    return scenario;
}

inline Scenario one_lawn() {
    return scenario_of("A lawn at Quarry Row", {storm_of("storm", half_an_hour())});
}

inline std::vector<SiteLedger> ledgers_of(const Scenario& scenario) {
    std::vector<SiteLedger> out;
    for (const Storm& storm : scenario.storms)
        out.push_back(keep_ledger(scenario.site, storm.rain));
    return out;
}

/// Another search path for programs, until the end of the scope.
class SearchPath {
public:
    explicit SearchPath(const std::string& path) {
        if (const char* old = std::getenv("PATH"); old != nullptr) old_ = old;
        ::setenv("PATH", path.c_str(), 1);
    }
    SearchPath(const SearchPath&) = delete;
    SearchPath& operator=(const SearchPath&) = delete;
    ~SearchPath() {
        if (old_) {
            ::setenv("PATH", old_->c_str(), 1);
        } else {
            ::unsetenv("PATH");
        }
    }

private:
    std::optional<std::string> old_;
};

}  // namespace rainledger::scenes
