#include <cmath>
#include <utility>

#include "ledger/cases.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

using testing::storm_of;

Surface surface_of(std::string name, double area_m2, Losses losses,
                   std::vector<RunsOnto> onto = {}) {
    Surface out;
    out.name = std::move(name);
    out.area_m2 = area_m2;
    out.losses = std::move(losses);
    out.runs_onto = std::move(onto);
    return out;
}

double volume(const Surface& surface, double depth_mm) {
    return surface.area_m2 * depth_mm / 1000.0;
}

}  // namespace

TEST_CASE("an impervious giver hands its excess on at the instant it leaves") {
    // 24 mm/h on a roof with 2 mm of storage: full after 5 min, then 24 mm/h on 300 m2 onto 100 m2
    // of verge is 72 mm/h beside its own 24 mm/h. The verge takes 30 mm/h.
    Site site{{surface_of("roof", 300.0, Impervious{}, {{1, 1.0}}),
               surface_of("verge", 100.0, ConstantRate{30.0, 0.0})}};
    site.surfaces[0].depression_storage_mm = 2.0;
    const SiteLedger ledger = keep_ledger(site, storm_of(15.0, {6.0, 0.0}));
    const SurfaceLedger& verge = ledger.surfaces[1];
    CHECK_THAT(verge.total.run_on_mm, WithinAbs(12.0, 1e-12));
    CHECK_THAT(verge.total.infiltrated_mm, WithinAbs(2.0 + 5.0, 1e-12));
    CHECK_THAT(verge.total.excess_mm, WithinAbs(11.0, 1e-12));
    CHECK_THAT(verge.runoff_start_h.value(), WithinAbs(5.0 / 60.0, 1e-14));
    CHECK(verge.closure_mm < 1e-13);
    CHECK_THAT(ledger.site.total.rain_mm, WithinAbs(6.0, 1e-14));
    CHECK(ledger.site.total.run_on_mm == 0.0);
    CHECK_THAT(ledger.site.total.excess_mm, WithinAbs(11.0 / 4.0, 1e-12));
}

TEST_CASE("run-on is not intercepted and reaches the soil meanwhile") {
    Site site{{surface_of("roof", 100.0, Impervious{}, {{1, 1.0}}),
               surface_of("verge", 100.0, ConstantRate{20.0, 0.0})}};
    site.surfaces[1].interception_mm = 6.0;
    // 12 mm/h for an hour: half an hour of rain is intercepted; 12 mm/h of run-on infiltrate
    // throughout, then 24 mm/h exceed 20 mm/h by 4 mm/h.
    const SurfaceLedger verge = keep_ledger(site, storm_of(60.0, {12.0})).surfaces[1];
    CHECK_THAT(verge.total.initial_loss_mm, WithinAbs(6.0, 1e-12));
    CHECK_THAT(verge.total.infiltrated_mm, WithinAbs(6.0 + 10.0, 1e-12));
    CHECK_THAT(verge.total.excess_mm, WithinAbs(2.0, 1e-12));
}

TEST_CASE("shares go where they are sent and the rest to the place drained to") {
    Site site{{surface_of("yard", 200.0, Impervious{}, {{1, 0.3}, {2, 0.5}}),
               surface_of("verge", 100.0, Impervious{}), surface_of("bed", 50.0, Impervious{})}};
    site.surfaces[1].drains_to = "CB-2";
    const SiteLedger ledger = keep_ledger(site, storm_of(60.0, {10.0}));
    CHECK_THAT(ledger.surfaces[1].total.run_on_mm, WithinAbs(6.0, 1e-12));
    CHECK_THAT(ledger.surfaces[2].total.run_on_mm, WithinAbs(20.0, 1e-12));
    REQUIRE(ledger.places.size() == 2);
    const PlaceLedger& outlet = ledger.places[0];
    const PlaceLedger& inlet = ledger.places[1];
    CHECK(outlet.name == "outlet");
    CHECK(outlet.area_m2 == 250.0);
    // The yard sends 0.3 * 2 m3 to the verge, which drains elsewhere: run-on of the outlet's row.
    CHECK_THAT(outlet.total.run_on_mm, WithinAbs(-0.6 / 250.0 * 1000.0, 1e-12));
    CHECK_THAT(outlet.total.excess_mm, WithinAbs((2.5 - 0.6) / 250.0 * 1000.0, 1e-12));
    CHECK_THAT(inlet.total.run_on_mm, WithinAbs(6.0, 1e-12));
    CHECK_THAT(inlet.total.excess_mm, WithinAbs(16.0, 1e-12));
    CHECK_THAT(ledger.site.figures.excess_volume_m3, WithinAbs(3.5, 1e-12));
    for (const PlaceLedger& place : ledger.places)
        CHECK(place.closure_mm < 1e-12);
}

TEST_CASE("a curve number adds run-on to its cumulative rain") {
    Site site{{surface_of("roof", 100.0, Impervious{}, {{1, 1.0}}),
               surface_of("yard", 100.0, CurveNumber{80.0})}};
    const SiteLedger ledger = keep_ledger(site, storm_of(60.0, {10.0, 10.0}));
    const RetentionCurve curve{63.5, 12.7};
    CHECK_THAT(ledger.surfaces[1].total.excess_mm,
               WithinAbs(cumulative_runoff_mm(curve, 40.0), 1e-11));
    CHECK_THAT(ledger.surfaces[1].runoff_start_h.value(), WithinAbs(12.7 / 20.0, 1e-12));
}

TEST_CASE("below a giver that infiltrates, volumes are exact and accounts hold to a millionth") {
    testing::Cases cases(20260306);
    for (int i = 0; i < 25; ++i) {
        INFO("case " << i);
        const Hyetograph rain = cases.storm();
        Surface giver = cases.infiltrating_surface();
        Surface receiver = cases.infiltrating_surface();
        giver.runs_onto = {{1, 0.6}};
        receiver.name = "below";
        const Site site{{giver, receiver}};
        const SiteLedger ledger = keep_ledger(site, rain);
        CHECK_FALSE(ledger.coarse_run_on);
        CHECK_THAT(volume(receiver, ledger.surfaces[1].total.run_on_mm),
                   WithinAbs(0.6 * volume(giver, ledger.surfaces[0].total.excess_mm), 1e-10));
        CHECK(ledger.surfaces[1].closure_mm < 1e-9);
        CHECK(ledger.site.closure_mm < 1e-9);
        std::vector<double> cuts;
        for (double at = rain.edges_h.front() + 0.031; at < rain.edges_h.back(); at += 0.031)
            cuts.push_back(at);
        const SiteLedger cut = keep_ledger(site, cut_hyetograph(rain, cuts).rain);
        CHECK_THAT(cut.surfaces[1].total.excess_mm,
                   WithinAbs(ledger.surfaces[1].total.excess_mm, 2e-6));
        CHECK_THAT(cut.surfaces[1].total.infiltrated_mm,
                   WithinAbs(ledger.surfaces[1].total.infiltrated_mm, 2e-6));
    }
}

TEST_CASE("a receiver whose ponding falls inside a step is right, not settled by chance") {
    // A bare soil pours onto a verge that ponds within the step. Marched with the giver's excess in
    // 2 x 10^5 equal parts as the reference: the mean-rate error falls with their square.
    const Hyetograph rain = storm_of(60.0, {60.0});
    const Horton soil{{40.0, 5.0, 2.0}, 0.0};
    const GreenAmpt verge{30.0, 40.0};
    const Site site{
        {surface_of("soil", 100.0, soil, {{1, 1.0}}), surface_of("verge", 100.0, verge)}};
    const SurfaceLedger below = keep_ledger(site, rain).surfaces[1];

    constexpr int kParts = 200000;
    std::vector<double> edges{0.0};
    std::vector<double> depths;
    double before = 0.0;
    for (int i = 1; i <= kParts; ++i) {
        edges.push_back(static_cast<double>(i) / kParts);
        // 60 mm/h exceeds f0 throughout: the soil's excess is rain less its curve.
        const double excess = 60.0 * edges.back() - horton_cumulative(soil.curve, edges.back());
        depths.push_back(60.0 / kParts + (excess - before));
        before = excess;
    }
    Surface alone = surface_of("verge", 100.0, verge);
    const SurfaceLedger fine =
        keep_ledger({{alone}}, make_hyetograph(std::move(edges), "h", std::move(depths)))
            .surfaces[0];
    CHECK_THAT(below.total.infiltrated_mm, WithinAbs(fine.total.infiltrated_mm, 1e-6));
    constexpr double kSecond = 1.0 / 3600.0;
    CHECK_THAT(below.runoff_start_h.value(), WithinAbs(fine.runoff_start_h.value(), kSecond));
    CHECK_THAT(below.ponding.at(0).start_h, WithinAbs(fine.ponding.at(0).start_h, kSecond));
}

TEST_CASE("run-on passes down a chain and nothing is lost on the way") {
    testing::Cases cases(20260307);
    for (int i = 0; i < 25; ++i) {
        INFO("case " << i);
        const Hyetograph rain = cases.storm();
        Site site;
        for (std::size_t k = 0; k < 4; ++k) {
            site.surfaces.push_back(k == 0 ? surface_of("roof", 400.0, Impervious{})
                                           : cases.infiltrating_surface());
            site.surfaces[k].name = "surface " + std::to_string(k);
            if (k < 3) site.surfaces[k].runs_onto = {{k + 1, k == 1 ? 0.5 : 1.0}};
        }
        const SiteLedger ledger = keep_ledger(site, rain);
        CHECK(ledger.site.closure_mm <= 1e-9 * std::max(1.0, ledger.site.total.rain_mm));
        double reached = volume(site.surfaces[3], ledger.surfaces[3].total.excess_mm) +
                         0.5 * volume(site.surfaces[1], ledger.surfaces[1].total.excess_mm);
        CHECK_THAT(ledger.site.figures.excess_volume_m3, WithinAbs(reached, 1e-9));
    }
}

TEST_CASE("the order in which surfaces are listed does not matter") {
    const Surface roof = surface_of("roof", 300.0, Impervious{}, {{1, 1.0}});
    const Surface verge = surface_of("verge", 100.0, GreenAmpt{10.0, 22.0});
    Surface roof_last = roof;
    roof_last.runs_onto = {{0, 1.0}};
    const Hyetograph rain = storm_of(5.0, {1.0, 3.0, 6.0, 2.0});
    const SiteLedger one = keep_ledger({{roof, verge}}, rain);
    const SiteLedger other = keep_ledger({{verge, roof_last}}, rain);
    CHECK(one.surfaces[1].total.excess_mm == other.surfaces[0].total.excess_mm);
}

}  // namespace rainledger
