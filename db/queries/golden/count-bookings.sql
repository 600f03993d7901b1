select `branch_id` as `branchId`, `package_id` as `packageId`, `body_type` as `bodyType`, `expected_on` as `on`, count(*) as `cars`
from (select * from bookings where branch_id in (select value from json_each(?))) as `job_facts`
where job_facts.package_id in (select value from json_each(?)) and job_facts.body_type in (select value from json_each(?)) and `expected_on` >= ? and `expected_on` <= ?
group by `branch_id`, `expected_on`, `package_id`, `body_type`;
