select `job_id` as `jobId`, `made_on` as `madeOn`, `decision` as `decision`, `decided_on` as `decidedOn`, proposed_decision is not null as `waiting`, `zone` as `zone`, `cause` as `cause`, `cost_cents` as `costCents`, `paid_on` as `paidOn`
from (select * from claims where branch_id in (select value from json_each(?))) as `claims`
where `made_on` <= ?
order by `claims`.`id` asc;
