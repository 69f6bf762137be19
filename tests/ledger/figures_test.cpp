#include <cmath>

#include "ledger/cases.hpp"
#include "test.hpp"

// Windows, peaks, reporting steps and the phi index.
namespace rainledger {
namespace {

using testing::storm_of;

Surface paved(double area_m2) {
    Surface out;
    out.name = "paving";
    out.area_m2 = area_m2;
    return out;
}

Surface matched(double observed_mm, double storage_mm = 0.0, double interception_mm = 0.0) {
    Surface out;
    out.name = "plot";
    out.area_m2 = 100.0;
    out.losses = PhiIndex{observed_mm};
    out.depression_storage_mm = storage_mm;
    out.interception_mm = interception_mm;
    return out;
}

}  // namespace

TEST_CASE("worst windows slide over the step means") {
    // 12-minute steps of 0, 60, 30, 0 mm/h on 3600 m2: 1 mm/h is 1 L/s.
    const Hyetograph rain = storm_of(12.0, {0.0, 12.0, 6.0, 0.0});
    const ExcessFigures figures = keep_ledger({{paved(3600.0)}}, rain).site.figures;
    CHECK_THAT(figures.worst_flow_l_per_s[0], WithinAbs(60.0, 1e-10));
    CHECK_THAT(figures.worst_flow_l_per_s[1], WithinAbs(60.0, 1e-10));
    CHECK_THAT(figures.worst_flow_l_per_s[2], WithinAbs((12.0 * 60.0 + 3.0 * 30.0) / 15.0, 1e-10));
    CHECK_THAT(figures.worst_flow_l_per_s[3], WithinAbs(18.0 / 0.5, 1e-10));
    CHECK_THAT(figures.peak_excess_mm_per_h, WithinAbs(60.0, 1e-10));
    CHECK_THAT(figures.excess_volume_m3, WithinAbs(64.8, 1e-10));
    CHECK_THAT(figures.volumetric_runoff_coefficient.value(), WithinAbs(1.0, 1e-14));
}

TEST_CASE("a window longer than the record is dry outside it") {
    const ExcessFigures figures = keep_ledger({{paved(3600.0)}}, storm_of(4.0, {4.0})).site.figures;
    CHECK_THAT(figures.worst_flow_l_per_s[0], WithinAbs(48.0, 1e-10));
    CHECK_THAT(figures.worst_flow_l_per_s[3], WithinAbs(8.0, 1e-10));
}

TEST_CASE("worst windows agree with a search over many positions") {
    testing::Cases cases(20260308);
    for (int i = 0; i < 20; ++i) {
        const Hyetograph rain = cases.storm();
        const SurfaceLedger ledger = keep_ledger({{paved(3600.0)}}, rain).surfaces.front();
        const auto depth_until = [&](double at) {
            double sum = 0.0;
            for (std::size_t k = 0; k < rain.steps(); ++k) {
                const double share = (at - rain.edges_h[k]) / rain.duration_h[k];
                sum += ledger.rows[k].accounts.excess_mm * std::clamp(share, 0.0, 1.0);
            }
            return sum;
        };
        double best = 0.0;
        for (double at = rain.edges_h.front() - 0.25; at < rain.edges_h.back(); at += 0.002)
            best = std::max(best, (depth_until(at + 0.25) - depth_until(at)) / 0.25);
        INFO("case " << i);
        CHECK(ledger.figures.worst_flow_l_per_s[2] >= best - 1e-9);
        CHECK(ledger.figures.worst_flow_l_per_s[2] <= best * 1.02 + 1e-9);
    }
}

TEST_CASE("no rain has no runoff coefficient") {
    const ExcessFigures figures = keep_ledger({{paved(10.0)}}, storm_of(5.0, {0.0})).site.figures;
    CHECK_FALSE(figures.volumetric_runoff_coefficient);
    CHECK(figures.peak_excess_mm_per_h == 0.0);
}

TEST_CASE("a phi index leaves the observed excess, with storage and interception in place") {
    const Hyetograph rain = storm_of(30.0, {4.0, 7.0, 34.0, 56.0, 53.0, 5.0, 2.0});
    for (const double observed : {1.0, 40.0, 90.0, 120.0}) {
        for (const double storage : {0.0, 6.0}) {
            const SurfaceLedger ledger =
                keep_ledger({{matched(observed, storage, 2.0)}}, rain).surfaces.front();
            INFO("observed " << observed << " storage " << storage);
            CHECK_THAT(ledger.total.excess_mm, WithinAbs(observed, 1e-9));
            CHECK(ledger.phi_index_mm_per_h.value() > 0.0);
        }
    }
}

TEST_CASE("the ends of the phi index") {
    const Hyetograph rain = storm_of(30.0, {4.0, 34.0, 5.0});
    CHECK_THAT(keep_ledger({{matched(0.0)}}, rain).surfaces[0].phi_index_mm_per_h.value(),
               WithinRel(68.0, 1e-15));  // the peak net rate
    CHECK(keep_ledger({{matched(43.0)}}, rain).surfaces[0].phi_index_mm_per_h == 0.0);
    CHECK(keep_ledger({{matched(43.0 * (1.0 + 5e-10))}}, rain).unmatched.empty());
    const SiteLedger more = keep_ledger({{matched(43.1)}}, rain);
    REQUIRE(more.unmatched.size() == 1);
    CHECK(more.unmatched[0].surface == 0);
    CHECK_THAT(more.unmatched[0].most_mm, WithinRel(43.0, 1e-14));
    // With storage, zero excess asks for less than the peak rate.
    CHECK(keep_ledger({{matched(0.0, 5.0)}}, rain).surfaces[0].phi_index_mm_per_h.value() < 68.0);
}

TEST_CASE("a ledger reported at other steps is exact, and totals and instants stay") {
    testing::Cases cases(20260309);
    for (int i = 0; i < 30; ++i) {
        INFO("case " << i);
        const Hyetograph rain = cases.storm();
        Surface surface = cases.surface();
        const Site site{{surface}};
        const SiteLedger plain = keep_ledger(site, rain);
        for (const double every_h : {1.0 / 60.0, 0.3, 5.0}) {
            const ReportedLedger reported = report_every(site, rain, every_h, plain);
            REQUIRE(reported.edges_h.size() == reported.ledger.site.rows.size() + 1);
            CHECK(reported.edges_h.back() == rain.edges_h.back());
            double rainfall = 0.0;
            double excess = 0.0;
            for (const LedgerRow& row : reported.ledger.surfaces[0].rows) {
                rainfall += row.accounts.rain_mm;
                excess += row.accounts.excess_mm;
            }
            CHECK_THAT(rainfall, WithinAbs(total_depth_mm(rain), 1e-11));
            CHECK_THAT(excess, WithinAbs(plain.surfaces[0].total.excess_mm, 1e-10));
            CHECK(reported.ledger.surfaces[0].runoff_start_h == plain.surfaces[0].runoff_start_h);
            CHECK(reported.ledger.site.figures.peak_excess_mm_per_h ==
                  plain.site.figures.peak_excess_mm_per_h);
        }
    }
}

}  // namespace rainledger
